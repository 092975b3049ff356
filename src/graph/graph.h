/* Symmetry of plain coloured graphs. The only user of nauty. */
#ifndef DW_GRAPH_GRAPH_H
#define DW_GRAPH_GRAPH_H

#include <stddef.h>

enum { GRAPH_VERTICES_MAX = 20000 };

/* A graph with coloured vertices and coloured edges. Borrowed by the calls. */
struct coloured_graph {
    int n;                     /* vertices */
    const int *colour;         /* [n], any values from 0 */
    int m;                     /* edges */
    const int (*edges)[2];     /* [m] */
    const int *edge_colour;    /* [m], any values from 0 */
};

/* A byte string that two graphs share exactly where one is the other with its
 * vertices renumbered, colours kept. Gives its length; *bytes is the caller's to
 * free. 0 and NULL over GRAPH_VERTICES_MAX (vertices and edges together). */
size_t graph_certificate(const struct coloured_graph *g, unsigned char **bytes);

/* orbit[n]: the least vertex that an automorphism carries it to. Over the limit
 * every vertex is its own orbit. */
void graph_orbits(const struct coloured_graph *g, int *orbit);

#endif
