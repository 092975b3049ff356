/* What went wrong with something a user gave: passed up, printed by the
 * outermost layer only. */
#ifndef DW_BASE_ERROR_H
#define DW_BASE_ERROR_H

enum status {
    ST_OK = 0,
    ST_UNREADABLE, /* the input is not what it claims to be */
    ST_TOO_LARGE,  /* over a stated limit */
    ST_IO,         /* the system refused (open, read, write, rename) */
    ST_UNSUPPORTED /* read, understood, and not done by this version */
};

struct error {
    enum status status;
    long line;      /* 1-based, 0 where it is not known */
    long column;    /* 1-based, 0 where it is not known */
    char text[400]; /* one sentence: what is wrong and what to do; safe to show */
};

/* Fills the record and returns the status, so that a reader can
 * `return error_set(...)`. The text is made safe for a terminal. err may be NULL. */
enum status error_set(struct error *err, enum status status, long line, long column, const char *format, ...)
    __attribute__((format(printf, 5, 6)));

#endif
