/* The one call that verbs, stream, panes and tests share. */
#ifndef DW_ENGINE_ANSWER_H
#define DW_ENGINE_ANSWER_H

#include "core/species.h"
#include "lewis/lewis.h"
#include "shape/shape.h"
#include "shape/symmetry.h"

struct answer_options {
    enum preference prefer;
    bool as_drawn;          /* or-ed with the species' own flag */
    int list_max;           /* forms to list */
    bool no_mends;
    bool no_shape;          /* tally and forms only */
    bool no_symmetry;
};

struct caution {
    const char *code;       /* "azide", ... */
    char *text;             /* one sentence, defers to the safety data sheet and qualified people */
};

struct answer {
    struct species *species;     /* a copy of what was asked about */
    struct lewis *lewis;         /* under the asked preference */
    struct lewis *low;           /* under PREFER_LOW_CHARGE; may be the same object as lewis */
    struct shape *shape;         /* NULL with no_shape or no atoms */
    struct symmetry *symmetry;   /* NULL with no_shape, no_symmetry or no atoms */
    struct caution *cautions;
    int n_cautions;
    enum verdict verdict;        /* of the whole: lewis, raised to beyond by the shape rules */
};

/* Borrows s. The caller frees. */
struct answer *answer_make(const struct species *s, const struct answer_options *options);
void answer_free(struct answer *a);

#endif
