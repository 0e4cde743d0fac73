/* SPDX-License-Identifier: GPL-3.0-or-later
 * The names of the choices of a push. */
#include "report/push_words.h"

#include <stddef.h>

const char *utw_support_word(utw_support support)
{
    static const char *const word[UTW_SUPPORT_COUNT] = {
        [UTW_FIXED_FREE] = "fixed-free",
        [UTW_FIXED_FIXED] = "fixed-fixed",
        [UTW_FORKED] = "forked",
        [UTW_FIXED_FORKED] = "fixed-forked",
    };
    return (int)support >= 0 && support < UTW_SUPPORT_COUNT ? word[support] : NULL;
}

const char *utw_hold_warping_word(utw_hold_warping warping)
{
    static const char *const word[] = {
        [UTW_WARPING_USUAL] = "usual", [UTW_WARPING_FREE] = "free", [UTW_WARPING_HELD] = "held"};
    return (int)warping >= 0 && warping <= UTW_WARPING_HELD ? word[warping] : NULL;
}
