#include "config.h"

#include "base/error.h"

#include "base/text.h"

#include <stdarg.h>
#include <stdio.h>
#include <string.h>

enum status error_set(struct error *err, enum status status, long line, long column, const char *format, ...)
{
    char raw[1024];
    struct text safe;
    va_list args;

    if (!err)
        return status;
    va_start(args, format);
    vsnprintf(raw, sizeof raw, format, args);
    va_end(args);
    text_init(&safe);
    text_add_safe(&safe, raw, sizeof err->text - 8);
    err->status = status;
    err->line = line;
    err->column = column;
    memcpy(err->text, safe.s, safe.length + 1);
    text_done(&safe);
    return status;
}
