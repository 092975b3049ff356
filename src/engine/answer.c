#include "config.h"

#include "engine/answer.h"

#include "base/alloc.h"
#include "engine/caution.h"

/* A shape outside the model makes the whole answer beyond it. */
static enum verdict whole_verdict(const struct answer *a)
{
    int i;

    if (a->lewis->verdict != VERDICT_SOUND || !a->shape)
        return a->lewis->verdict;
    for (i = 0; i < a->shape->n_atoms; i++)
        if (a->shape->centres[i].beyond)
            return VERDICT_BEYOND;
    return VERDICT_SOUND;
}

struct answer *answer_make(const struct species *s, const struct answer_options *options)
{
    struct answer *a = NEW(struct answer);
    struct lewis_options lo = {options->prefer, options->as_drawn || s->as_drawn, options->list_max, options->no_mends};

    a->species = species_copy(s);
    a->lewis = a->low = lewis_solve(a->species, &lo);
    /* Shapes follow the low-charge mean orders of the species, whatever is shown. */
    if (options->prefer != PREFER_LOW_CHARGE && s->n_atoms > 0) {
        struct lewis_options low = {PREFER_LOW_CHARGE, lo.as_drawn, 0, true};

        a->low = lewis_solve(a->species, &low);
    }
    if (s->n_atoms > 0 && !options->no_shape) {
        a->shape = shape_make(a->species, a->low);
        if (!options->no_symmetry && a->shape->placed)
            a->symmetry = symmetry_make(a->species, a->low, a->shape, SYMMETRY_TOLERANCE);
    }
    a->cautions = caution_find(a->species, a->low, &a->n_cautions);
    a->verdict = whole_verdict(a);
    return a;
}

void answer_free(struct answer *a)
{
    int i;

    if (!a)
        return;
    for (i = 0; i < a->n_cautions; i++)
        alloc_free(a->cautions[i].text);
    alloc_free(a->cautions);
    symmetry_free(a->symmetry);
    shape_free(a->shape);
    if (a->low != a->lewis)
        lewis_free(a->low);
    lewis_free(a->lewis);
    species_free(a->species);
    alloc_free(a);
}
