#include "config.h"

#include "base/text.h"

#include "base/alloc.h"

#include <stdarg.h>
#include <stdio.h>
#include <string.h>

void text_init(struct text *t)
{
    t->room = 32;
    t->s = alloc_new(t->room, 1);
    t->length = 0;
}

void text_done(struct text *t)
{
    alloc_free(t->s);
    memset(t, 0, sizeof *t);
}

void text_clear(struct text *t)
{
    t->length = 0;
    t->s[0] = '\0';
}

static void reserve(struct text *t, size_t more)
{
    size_t need = t->length + more + 1;

    if (need <= t->room)
        return;
    while (t->room < need)
        t->room = t->room ? t->room * 2 : 32;
    t->s = alloc_resize(t->s, t->room, 1);
}

void text_add_n(struct text *t, const char *s, size_t length)
{
    reserve(t, length);
    memcpy(t->s + t->length, s, length);
    t->length += length;
    t->s[t->length] = '\0';
}

void text_add(struct text *t, const char *s) { text_add_n(t, s, strlen(s)); }

void text_add_char(struct text *t, char c) { text_add_n(t, &c, 1); }

void text_addf(struct text *t, const char *format, ...)
{
    va_list args, again;
    int length;

    va_start(args, format);
    va_copy(again, args);
    length = vsnprintf(NULL, 0, format, args);
    va_end(args);
    if (length > 0) {
        reserve(t, (size_t)length);
        vsnprintf(t->s + t->length, (size_t)length + 1, format, again);
        t->length += (size_t)length;
    }
    va_end(again);
}

char *text_take(struct text *t)
{
    char *s = t->s;

    text_init(t);
    return s;
}

size_t text_utf8(const char *s, size_t length, unsigned *code)
{
    static const unsigned least[5] = {0, 0, 0x80, 0x800, 0x10000};
    unsigned char c;
    unsigned value;
    size_t need, i;

    if (length == 0)
        return 0;
    c = (unsigned char)s[0];
    if (c < 0x80) {
        *code = c;
        return 1;
    }
    if (c >= 0xc2 && c <= 0xdf)
        need = 2, value = c & 0x1fu;
    else if (c >= 0xe0 && c <= 0xef)
        need = 3, value = c & 0x0fu;
    else if (c >= 0xf0 && c <= 0xf4)
        need = 4, value = c & 0x07u;
    else
        return 0;
    if (length < need)
        return 0;
    for (i = 1; i < need; i++) {
        if (((unsigned char)s[i] & 0xc0u) != 0x80)
            return 0;
        value = value << 6 | ((unsigned char)s[i] & 0x3fu);
    }
    if (value < least[need] || value > 0x10ffff || (value >= 0xd800 && value <= 0xdfff))
        return 0;
    *code = value;
    return need;
}

static bool unsafe(unsigned code)
{
    return code < 0x20 || (code >= 0x7f && code <= 0x9f) || code == 0x200e || code == 0x200f || code == 0x061c ||
           (code >= 0x2028 && code <= 0x202e) || (code >= 0x2066 && code <= 0x2069) || code == 0xfeff;
}

void text_add_safe(struct text *t, const char *s, size_t max_bytes)
{
    size_t length = strlen(s), i = 0, start = t->length;

    while (i < length) {
        unsigned code = 0;
        size_t n = text_utf8(s + i, length - i, &code);

        if (max_bytes && t->length - start + (n ? n : 1) > max_bytes) {
            text_add(t, "...");
            return;
        }
        if (n == 0 || unsafe(code))
            text_add_char(t, '?');
        else
            text_add_n(t, s + i, n);
        i += n ? n : 1;
    }
}

bool text_to_int(const char *s, size_t length, int low, int high, int *value)
{
    long long sum = 0;
    bool negative = false;
    size_t i = 0;

    if (length && (s[0] == '+' || s[0] == '-')) {
        negative = s[0] == '-';
        i = 1;
    }
    if (i == length)
        return false;
    for (; i < length; i++) {
        if (s[i] < '0' || s[i] > '9')
            return false;
        sum = sum * 10 + (s[i] - '0');
        if (sum > 1000000000)
            return false;
    }
    if (negative)
        sum = -sum;
    if (sum < low || sum > high)
        return false;
    *value = (int)sum;
    return true;
}
