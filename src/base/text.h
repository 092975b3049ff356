/* Growing text, and text that is safe to show. */
#ifndef DW_BASE_TEXT_H
#define DW_BASE_TEXT_H

#include <stdbool.h>
#include <stddef.h>

struct text {
    char *s;       /* always NUL-terminated once text_init was called */
    size_t length; /* bytes, the NUL not counted */
    size_t room;
};

void text_init(struct text *t);  /* empty text in the caller's storage */
void text_done(struct text *t);  /* frees the contents */
void text_clear(struct text *t); /* makes it empty, keeps the room */
void text_add(struct text *t, const char *s);
void text_add_n(struct text *t, const char *s, size_t length);
void text_add_char(struct text *t, char c);
void text_addf(struct text *t, const char *format, ...) __attribute__((format(printf, 2, 3)));
char *text_take(struct text *t); /* moves the string out; the caller frees it; t is empty again */

/* Appends s with every control character (C0, DEL, C1), every byte that is not
 * valid UTF-8 and every bidirectional override replaced by '?', so that what
 * came from a file can never drive a terminal. max_bytes 0 means no limit;
 * a longer text is cut at a character and ends in "...". */
void text_add_safe(struct text *t, const char *s, size_t max_bytes);

/* The number of bytes of the UTF-8 character at s and its code point; 0 where s
 * holds no valid character (overlong forms and surrogates are invalid). */
size_t text_utf8(const char *s, size_t length, unsigned *code);

/* Reads a whole decimal integer (optional sign) that fills the string; false
 * where it does not or is outside low..high. */
bool text_to_int(const char *s, size_t length, int low, int high, int *value);

#endif
