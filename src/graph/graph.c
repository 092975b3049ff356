#include "config.h"

#include "graph/graph.h"

#include "base/alloc.h"

#include <nauty.h>
#include <nausparse.h>
#include <stdlib.h>
#include <string.h>

/* Edge colours by subdivision: every edge becomes a vertex of its own, coloured
 * after all vertex colours. */
struct shadow {
    sparsegraph graph;
    int n;           /* vertices and edges of the coloured graph */
    int *colour;     /* [n] */
    int *lab, *ptn, *orbits;
};

static const int *sort_colour;

static int by_colour(const void *a, const void *b)
{
    int x = *(const int *)a, y = *(const int *)b;

    if (sort_colour[x] != sort_colour[y])
        return sort_colour[x] < sort_colour[y] ? -1 : 1;
    return x - y;
}

static void shadow_init(struct shadow *w, const struct coloured_graph *g)
{
    int i, shift = 0;
    size_t at = 0;

    SG_INIT(w->graph);
    w->n = g->n + g->m;
    w->colour = NEW_ARRAY(int, w->n);
    w->lab = NEW_ARRAY(int, w->n);
    w->ptn = NEW_ARRAY(int, w->n);
    w->orbits = NEW_ARRAY(int, w->n);
    w->graph.nv = w->n;
    w->graph.nde = 4 * (size_t)g->m;
    w->graph.v = NEW_ARRAY(size_t, w->n);
    w->graph.d = NEW_ARRAY(int, w->n);
    w->graph.e = NEW_ARRAY(int, w->graph.nde);
    w->graph.vlen = w->graph.dlen = (size_t)w->n;
    w->graph.elen = w->graph.nde;
    for (i = 0; i < g->n; i++) {
        w->colour[i] = g->colour[i];
        shift = g->colour[i] >= shift ? g->colour[i] + 1 : shift;
    }
    for (i = 0; i < g->m; i++) {
        w->colour[g->n + i] = shift + g->edge_colour[i];
        w->graph.d[g->edges[i][0]]++;
        w->graph.d[g->edges[i][1]]++;
        w->graph.d[g->n + i] = 2;
    }
    for (i = 0; i < w->n; i++) {
        w->graph.v[i] = at;
        at += (size_t)w->graph.d[i];
        w->graph.d[i] = 0;
        w->lab[i] = i;
    }
    for (i = 0; i < g->m; i++) {
        int ends[2] = {g->edges[i][0], g->edges[i][1]}, k;

        for (k = 0; k < 2; k++) {
            w->graph.e[w->graph.v[ends[k]] + (size_t)w->graph.d[ends[k]]++] = g->n + i;
            w->graph.e[w->graph.v[g->n + i] + (size_t)w->graph.d[g->n + i]++] = ends[k];
        }
    }
    sort_colour = w->colour;
    qsort(w->lab, (size_t)w->n, sizeof *w->lab, by_colour);
    for (i = 0; i < w->n; i++)
        w->ptn[i] = i + 1 < w->n && w->colour[w->lab[i]] == w->colour[w->lab[i + 1]];
}

static void shadow_done(struct shadow *w)
{
    alloc_free(w->graph.v);
    alloc_free(w->graph.d);
    alloc_free(w->graph.e);
    alloc_free(w->colour);
    alloc_free(w->lab);
    alloc_free(w->ptn);
    alloc_free(w->orbits);
}

static void run(struct shadow *w, sparsegraph *canonical)
{
    static DEFAULTOPTIONS_SPARSEGRAPH(options);
    statsblk stats;

    options.getcanon = canonical != NULL;
    options.defaultptn = FALSE;
    sparsenauty(&w->graph, w->lab, w->ptn, w->orbits, &options, &stats, canonical);
}

static void put(unsigned char *bytes, size_t *at, int value)
{
    memcpy(bytes + *at, &value, sizeof value);
    *at += sizeof value;
}

size_t graph_certificate(const struct coloured_graph *g, unsigned char **bytes)
{
    struct shadow w;
    sparsegraph canonical;
    size_t length = 0, k;
    int i;

    *bytes = NULL;
    if (g->n < 1 || g->n + g->m > GRAPH_VERTICES_MAX)
        return 0;
    shadow_init(&w, g);
    SG_INIT(canonical);
    run(&w, &canonical);
    sortlists_sg(&canonical);
    *bytes = alloc_new((size_t)w.n * 2 + canonical.nde, sizeof(int));
    /* Colours stand in sorted order, so they are the same for every numbering. */
    for (i = 0; i < w.n; i++) {
        put(*bytes, &length, w.colour[w.lab[i]]);
        put(*bytes, &length, canonical.d[i]);
    }
    for (i = 0; i < w.n; i++)
        for (k = 0; k < (size_t)canonical.d[i]; k++)
            put(*bytes, &length, canonical.e[canonical.v[i] + k]);
    SG_FREE(canonical);
    shadow_done(&w);
    return length;
}

void graph_orbits(const struct coloured_graph *g, int *orbit)
{
    struct shadow w;
    int i;

    for (i = 0; i < g->n; i++)
        orbit[i] = i;
    if (g->n < 1 || g->n + g->m > GRAPH_VERTICES_MAX)
        return;
    shadow_init(&w, g);
    run(&w, NULL);
    for (i = 0; i < g->n; i++)
        orbit[i] = w.orbits[i];
    shadow_done(&w);
}
