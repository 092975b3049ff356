#include "config.h"

#include "base/alloc.h"

#include <stdint.h>
#include <stdlib.h>
#include <string.h>
#include <unistd.h>

static void (*failure_hook)(void);
static long fail_at = -1;

void alloc_on_failure(void (*hook)(void)) { failure_hook = hook; }

void alloc_fail_at(long n) { fail_at = n; }

static _Noreturn void out_of_memory(void)
{
    static const char message[] = "dotwright: out of memory: close other programs or take a smaller species\n";
    void (*hook)(void) = failure_hook;

    failure_hook = NULL;
    if (hook)
        hook();
    if (write(STDERR_FILENO, message, sizeof message - 1) < 0)
        _exit(3);
    _exit(3);
}

static int must_fail(void)
{
    if (fail_at < 0)
        return 0;
    return fail_at-- == 0;
}

void *alloc_new(size_t count, size_t size)
{
    void *block;

    if (count == 0 || size == 0)
        count = size = 1;
    if (must_fail() || count > SIZE_MAX / size)
        out_of_memory();
    block = calloc(count, size);
    if (!block)
        out_of_memory();
    return block;
}

void *alloc_resize(void *block, size_t count, size_t size)
{
    if (count == 0 || size == 0)
        count = size = 1;
    if (must_fail() || count > SIZE_MAX / size)
        out_of_memory();
    block = realloc(block, count * size);
    if (!block)
        out_of_memory();
    return block;
}

char *alloc_text_n(const char *text, size_t length)
{
    char *copy = alloc_new(length + 1, 1);

    if (length)
        memcpy(copy, text, length);
    return copy;
}

char *alloc_text(const char *text) { return text ? alloc_text_n(text, strlen(text)) : NULL; }

void alloc_free(void *block) { free(block); }
