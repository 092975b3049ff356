/* The elements H to Rn. Values come from data/elements.tsv, which names the
 * source of each column; a test compares the built table with the file. */
#ifndef DW_CORE_ELEMENT_H
#define DW_CORE_ELEMENT_H

#include <stdbool.h>
#include <stddef.h>

enum { ELEMENT_Z_MAX = 86 };

struct element {
    int z;
    const char *symbol;
    const char *name;
    int group;          /* 1..18; 0 for the lanthanides, whose group IUPAC leaves open */
    int period;         /* 1..6 */
    char block;         /* s p d f */
    int valence;        /* electrons counted in a Lewis structure; d block: s + d outside a noble-gas core; -1 unknown */
    double chi;         /* Pauling scale, Allred's revision; 0 where there is none */
    double weight;      /* CIAAW abridged 2021, u; the longest-lived mass number where there is no standard weight */
    int mass_number;    /* most abundant isotope */
    double mass;        /* of that isotope, u */
    double r1, r2, r3;  /* Pyykkö single, double, triple radii, ångström; 0 where there is none */
    double r_covalent;  /* Cordero 2008, ångström */
    double r_vdw;       /* Alvarez 2013, ångström; 0 where there is none */
};

const struct element *element_get(int z);                   /* NULL outside 1..86 */
int element_find(const char *symbol, size_t length);        /* exact case; 0 where there is none */
bool element_is_halogen(int z);                             /* F Cl Br I At */
/* The electrons that close its shell: 2 for H and He, else 8. */
int element_shell_target(int z);
/* True where a shell may stay short without counting: groups 1, 2, 13, and the d and f blocks. */
bool element_may_be_short(int z);
/* True where the atom may hold more than eight: p block from period 3 on, d and f blocks. */
bool element_may_expand(int z);

#endif
