/* The one allocator: never returns NULL.
 *
 * When memory runs out the hook (which restores the terminal) is called, one
 * line goes to standard error and the program stops with status 3. */
#ifndef DW_BASE_ALLOC_H
#define DW_BASE_ALLOC_H

#include <stddef.h>

void *alloc_new(size_t count, size_t size);                  /* zeroed; count * size is checked; owner frees */
void *alloc_resize(void *block, size_t count, size_t size);  /* like realloc, checked; new part is not zeroed */
char *alloc_text(const char *text);                          /* copy of a string; NULL gives NULL */
char *alloc_text_n(const char *text, size_t length);         /* copy of length bytes, NUL added */
void alloc_free(void *block);                                /* NULL is fine */

/* Called once before the program stops for lack of memory; NULL takes it away. */
void alloc_on_failure(void (*hook)(void));

/* For tests: let allocation number n from now (0 = the next) fail; a negative n never does. */
void alloc_fail_at(long n);

#define NEW(type) ((type *)alloc_new(1, sizeof(type)))
#define NEW_ARRAY(type, count) ((type *)alloc_new((size_t)(count), sizeof(type)))

#endif
