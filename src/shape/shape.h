/* The shape engine: domains, shapes, angles and lengths of every centre, and
 * coordinates of the whole species, from the low-charge mean orders. */
#ifndef DW_SHAPE_SHAPE_H
#define DW_SHAPE_SHAPE_H

#include "core/species.h"
#include "lewis/lewis.h"

#include <stdbool.h>

struct centre {                    /* one per atom */
    int neighbours;
    int lone_pairs;                /* stereochemically counted pairs (rounded mean) */
    bool odd;                      /* a lone odd electron counts as a domain */
    int domains;
    char cls[16];                  /* "AX3E", "AX2e"; "" with fewer than two neighbours */
    const char *electron_geometry; /* contract words; NULL where there is none */
    const char *shape;             /* contract words; NULL with fewer than two neighbours */
    const char *hybridization;     /* "sp3", "sp3d" (a customary label); NULL where it makes no sense */
    bool beyond;                   /* the shape rules do not hold here; a note says why */
};

struct shape_angle {
    int a, centre, b;              /* a < b */
    double degrees;                /* in the placed geometry */
    double expected_error;         /* degrees, mean error of its class on the training data */
};

struct lobe {                      /* a lone pair or odd electron, for drawing */
    int atom;
    bool odd;
    double direction[3];           /* unit vector in the frame of xyz */
};

struct shape_note {                /* a caution of the model, in one sentence */
    const char *code;
    int atom;                      /* -1: the whole species */
    char *text;
};

struct shape {
    int n_atoms, n_bonds;
    struct centre *centres;        /* [n_atoms] */
    double *length;                /* [n_bonds] ångström, as estimated */
    double *length_error;          /* [n_bonds] ångström, expected error */
    struct shape_angle *angles;    /* by centre, then a, b */
    int n_angles;
    double (*xyz)[3];              /* [n_atoms] ångström; centroid of mass near the origin */
    bool placed;                   /* false: no coordinates could be made (no atoms) */
    struct lobe *lobes;
    int n_lobes;
    struct shape_note *notes;
    int n_notes;
};

/* low must come from PREFER_LOW_CHARGE. Deterministic. The caller frees. */
struct shape *shape_make(const struct species *s, const struct lewis *low);
void shape_free(struct shape *shape);

#endif
