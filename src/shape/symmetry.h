/* What follows from a placed geometry: point group, vibrations by symmetry,
 * rotor, polarity. */
#ifndef DW_SHAPE_SYMMETRY_H
#define DW_SHAPE_SYMMETRY_H

#include "core/species.h"
#include "lewis/lewis.h"
#include "shape/shape.h"

#include <stdbool.h>

#define SYMMETRY_TOLERANCE 0.05    /* ångström, default for symmetry_make */

struct symmetry {
    char point_group[8];           /* "C3v" "Dinfh"; "" where it was not found */
    int symmetry_number;           /* 0 unknown */
    bool has_vibrations;
    char representation[160];      /* "2A1+2E"; "" where unknown */
    int ir, raman, both;           /* distinct fundamentals; meaningful with has_vibrations */
    const char *rotor;             /* "oblate symmetric top", "linear", "spherical top", "asymmetric top", "prolate symmetric top", "atom" */
    double constants[3];           /* GHz, A >= B >= C; a linear rotor: 0, B, B; 0 = does not exist */
    bool polar;                    /* decided by the group alone */
    bool has_dipole;               /* an estimate is given (never for ions) */
    double dipole;                 /* debye */
    double dipole_error;           /* debye, expected */
    double dipole_vector[3];       /* from - to +, frame of xyz */
};

/* tolerance in ångström. The caller frees. */
struct symmetry *symmetry_make(const struct species *s, const struct lewis *low, const struct shape *shape,
                               double tolerance);
void symmetry_free(struct symmetry *y);

#endif
