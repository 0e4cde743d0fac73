/* SPDX-License-Identifier: GPL-3.0-or-later
 * The one door to the heap: overflow is checked, and tests can count and refuse allocations. */
#ifndef UTW_BASE_MEMORY_H
#define UTW_BASE_MEMORY_H

#include <stddef.h>

/** count * size bytes, all zero; NULL when memory is out or the product overflows. A count of 0 gives a
 *  pointer that may be freed. Free with utw_free(). */
void *utw_alloc(size_t count, size_t size) __attribute__((malloc, warn_unused_result));

/** Resize an array to count * size bytes (new bytes are not cleared). On failure NULL, and the old block
 *  is still valid. */
void *utw_realloc(void *block, size_t count, size_t size) __attribute__((warn_unused_result));

/** Grow `*array` of elements of `size` bytes so that `needed` fit, doubling `*capacity`.
 *  Returns 0 when done, -1 when memory is out (the array is unchanged). */
int utw_grow(void **array, size_t *capacity, size_t needed, size_t size)
    __attribute__((warn_unused_result));

/** A copy of a string, or NULL. */
char *utw_copy_string(const char *text) __attribute__((warn_unused_result));

/** Free a block of utw_alloc or utw_realloc; NULL is allowed. */
void utw_free(void *block);

/** Blocks allocated and not yet freed in this thread; for tests of balance. */
long utw_memory_live(void);

/** Let the n-th allocation of this thread from now on fail, and every one after it; 0 switches this off. For tests. */
void utw_memory_fail_at(long n);

#endif
