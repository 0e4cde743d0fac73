/* SPDX-License-Identifier: GPL-3.0-or-later
 * Allocation with overflow check. The two thread-local counters are the seam for tests; nothing else in
 * the library is mutable and static. */
#include "base/memory.h"

#include <stdint.h>
#include <stdlib.h>
#include <string.h>

static _Thread_local long live_blocks;
static _Thread_local long refuse_at; /* 0: never; else allocations left before the refused one */

static int refused(void)
{
    if (refuse_at == 0) return 0;
    if (refuse_at == 1) return 1;
    refuse_at--;
    return 0;
}

void *utw_alloc(size_t count, size_t size)
{
    if (refused()) return NULL;
    if (count == 0) count = 1;
    void *block = calloc(count, size);
    if (block != NULL) live_blocks++;
    return block;
}

void *utw_realloc(void *block, size_t count, size_t size)
{
    if (refused()) return NULL;
    if (count == 0) count = 1;
    if (size != 0 && count > SIZE_MAX / size) return NULL;
    void *grown = realloc(block, count * size);
    if (grown != NULL && block == NULL) live_blocks++;
    return grown;
}

int utw_grow(void **array, size_t *capacity, size_t needed, size_t size)
{
    if (needed <= *capacity) return 0;
    size_t n = *capacity < 8 ? 8 : *capacity;
    while (n < needed) {
        if (n > SIZE_MAX / 2) return -1;
        n *= 2;
    }
    void *grown = utw_realloc(*array, n, size);
    if (grown == NULL) return -1;
    *array = grown;
    *capacity = n;
    return 0;
}

char *utw_copy_string(const char *text)
{
    const size_t n = strlen(text) + 1;
    char *copy = utw_alloc(n, 1);
    if (copy != NULL) memcpy(copy, text, n);
    return copy;
}

void utw_free(void *block)
{
    if (block != NULL) live_blocks--;
    free(block);
}

long utw_memory_live(void)
{
    return live_blocks;
}

void utw_memory_fail_at(long n)
{
    refuse_at = n;
}
