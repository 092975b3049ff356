/* The worksheet: several species, each with a name and a note, in one JSON file
 * (schema in data/worksheet.schema.json). Keys it does not know survive a load
 * and save. */
#ifndef DW_FORMAT_WORKSHEET_H
#define DW_FORMAT_WORKSHEET_H

#include "base/error.h"
#include "base/text.h"
#include "core/species.h"

enum { WORKSHEET_SPECIES_MAX = 10000 };

struct worksheet_entry {
    struct species *species;
    void *kept;                  /* the entry as it was read, for the keys we do not know */
};

struct worksheet {
    char *title;
    struct worksheet_entry *entries;
    int n, room;
    void *kept;                  /* likewise for the whole file */
};

struct worksheet *worksheet_new(void);
void worksheet_free(struct worksheet *w);
/* Takes species over; gives its index, -1 over the limit. */
int worksheet_take(struct worksheet *w, struct species *s);
void worksheet_remove(struct worksheet *w, int index);

/* NULL and err where it is not a worksheet. */
struct worksheet *worksheet_read(const char *bytes, size_t length, struct error *err);
/* Appends the JSON, with a newline at the end. */
void worksheet_write(const struct worksheet *w, struct text *out);

/* The demo worksheet that is built into the program. */
struct worksheet *worksheet_demo(void);

#endif
