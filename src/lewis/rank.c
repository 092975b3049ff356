#include "config.h"

#include "lewis/rank.h"

#include "base/alloc.h"
#include "core/element.h"
#include "graph/graph.h"

#include <stdlib.h>
#include <string.h>

/* Bonds on the shortest way from one atom to all; -1 where there is none. */
static void distances(const struct species *s, int from, int *distance)
{
    int *queue = NEW_ARRAY(int, s->n_atoms), head = 0, tail = 0, i;

    for (i = 0; i < s->n_atoms; i++)
        distance[i] = -1;
    distance[from] = 0;
    queue[tail++] = from;
    while (head < tail) {
        int at = queue[head++], near[SPECIES_NEIGHBOURS_MAX], n = species_neighbours(s, at, near, NULL);

        for (i = 0; i < n; i++)
            if (distance[near[i]] < 0) {
                distance[near[i]] = distance[at] + 1;
                queue[tail++] = near[i];
            }
    }
    alloc_free(queue);
}

double rank_score(const struct species *s, const struct form *f)
{
    int *charged = NEW_ARRAY(int, s->n_atoms), *distance = NULL, n = 0, i, j;
    double score = 0;

    for (i = 0; i < s->n_atoms; i++)
        if (f->formal_charge[i]) {
            charged[n++] = i;
            score += 0.5 * f->formal_charge[i] * element_get(s->atoms[i].z)->chi;
        }
    if (n > 1)
        distance = NEW_ARRAY(int, s->n_atoms);
    for (i = 0; i + 1 < n; i++) {
        distances(s, charged[i], distance);
        for (j = i + 1; j < n; j++) {
            int apart = distance[charged[j]];
            int product = f->formal_charge[charged[i]] * f->formal_charge[charged[j]];

            if (product > 0 && apart == 1)
                score += 1.0;
            else if (product < 0 && apart > 1)
                score += 0.1 * (apart - 1);
        }
    }
    alloc_free(charged);
    alloc_free(distance);
    return score;
}

static const struct species *sort_species;

static int by_rank(const void *a, const void *b)
{
    const struct form *x = a, *y = b;
    int c;

    if (x->score < y->score - 1e-9)
        return -1;
    if (x->score > y->score + 1e-9)
        return 1;
    /* Higher orders on earlier bonds first. */
    c = memcmp(y->order, x->order, (size_t)sort_species->n_bonds);
    if (c)
        return c;
    c = memcmp(y->lone_pairs, x->lone_pairs, (size_t)sort_species->n_atoms);
    return c ? c : memcmp(y->unpaired, x->unpaired, (size_t)sort_species->n_atoms);
}

void rank_sort(const struct species *s, struct form *forms, int n)
{
    sort_species = s;
    qsort(forms, (size_t)n, sizeof *forms, by_rank);
}

struct stamp {
    unsigned char *bytes;
    size_t length;
};

static struct stamp stamp_of(const struct species *s, const struct form *f, const int (*edges)[2], int *colour,
                             int *edge_colour)
{
    struct coloured_graph g = {s->n_atoms, colour, s->n_bonds, edges, edge_colour};
    struct stamp stamp;
    int i;

    for (i = 0; i < s->n_atoms; i++)
        colour[i] = ((s->atoms[i].z * 400 + s->atoms[i].isotope) * 12 + f->lone_pairs[i]) * 8 + f->unpaired[i];
    for (i = 0; i < s->n_bonds; i++)
        edge_colour[i] = f->order[i];
    stamp.length = graph_certificate(&g, &stamp.bytes);
    return stamp;
}

int rank_classes(const struct species *s, struct form *forms, int n)
{
    struct stamp *known = NEW_ARRAY(struct stamp, n);
    int(*edges)[2] = alloc_new((size_t)s->n_bonds, sizeof *edges);
    int *first = NEW_ARRAY(int, n), *colour = NEW_ARRAY(int, s->n_atoms), *edge_colour = NEW_ARRAY(int, s->n_bonds);
    int i, k, classes = 0;

    for (i = 0; i < s->n_bonds; i++) {
        edges[i][0] = s->bonds[i].a;
        edges[i][1] = s->bonds[i].b;
    }
    for (i = 0; i < n; i++) {
        struct stamp stamp = stamp_of(s, &forms[i], (const int(*)[2])edges, colour, edge_colour);

        for (k = 0; k < classes; k++)
            if (known[k].length == stamp.length && memcmp(known[k].bytes, stamp.bytes, stamp.length) == 0)
                break;
        if (k == classes) {
            first[classes] = i;
            known[classes++] = stamp;
        } else {
            alloc_free(stamp.bytes);
        }
        forms[i].cls = k;
        forms[i].alike = 0;
        forms[first[k]].alike++;
    }
    for (k = 0; k < classes; k++)
        alloc_free(known[k].bytes);
    alloc_free(known);
    alloc_free(edges);
    alloc_free(first);
    alloc_free(colour);
    alloc_free(edge_colour);
    return classes;
}
