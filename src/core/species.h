/* A species: which atoms, which of them are bonded, net charge, multiplicity.
 *
 * The struct is open for reading; every change goes through the functions here,
 * which keep it consistent (species_check). Atom and bond indices count from 0;
 * removing one moves the later ones down by one. Ownership: a species owns all
 * it points to. */
#ifndef DW_CORE_SPECIES_H
#define DW_CORE_SPECIES_H

#include <stdbool.h>
#include <stddef.h>

enum {
    SPECIES_ATOMS_MAX = 2000,     /* hydrogens included */
    SPECIES_NEIGHBOURS_MAX = 12,
    SPECIES_CHARGE_MAX = 60,      /* either sign */
    SPECIES_MULTIPLICITY_MAX = 30,
    SPECIES_NAME_MAX = 400,       /* bytes */
    SPECIES_NOTE_MAX = 20000      /* bytes */
};

enum { PIN_NONE = -1 };

struct atom {
    int z;
    int isotope;        /* mass number, 0 = natural mixture / most abundant */
    int row, col;       /* place on the sketch grid, meaningful where placed */
    bool placed;
    int drawn_charge;   /* formal charge as written in the input; a note, not a constraint */
    int pin_pairs;      /* lone pairs fixed by hand, or PIN_NONE */
    int pin_odd;        /* odd electrons fixed by hand, or PIN_NONE */
    int atom_class;     /* SMILES atom class, 0 = none */
};

struct bond {
    int a, b;           /* a < b */
    int order;          /* as drawn: 1, 2, 3; 0 = not stated */
    bool aromatic;      /* read as aromatic: order is then 0 */
    char slant;         /* SMILES '/' or '\\' read from a to b, 0 = none */
};

/* A stereo mark on an atom as SMILES gives it: neighbours in written order. */
enum { STEREO_IMPLICIT_H = -1 };
struct stereo {
    int atom;
    char kind[3];       /* "TH" "AL" "SP" "TB" "OH" */
    int number;         /* @ is TH1, @@ is TH2 */
    int n;              /* neighbours listed */
    int neighbour[8];
};

struct species {
    struct atom *atoms;
    int n_atoms, atoms_room;
    struct bond *bonds;
    int n_bonds, bonds_room;
    struct stereo *stereo;
    int n_stereo;
    int charge;
    bool charge_assumed;       /* nobody stated it: it is 0 */
    int multiplicity;          /* 2S + 1; kept at the lowest the electron count allows while assumed */
    bool multiplicity_assumed;
    bool as_drawn;             /* judge the drawn orders themselves */
    char *name;                /* UTF-8, never NULL */
    char *note;                /* UTF-8, never NULL */
};

struct species *species_new(void);
struct species *species_copy(const struct species *s);
void species_free(struct species *s);

/* Adds an atom and gives its index, -1 where the limit is reached or z is unknown. */
int species_add_atom(struct species *s, int z);
void species_remove_atom(struct species *s, int atom);         /* with its bonds and stereo marks */
/* Adds a bond and gives its index; -1 where an end does not exist, both ends are
 * one atom, the bond is there already, or an end has SPECIES_NEIGHBOURS_MAX. */
int species_add_bond(struct species *s, int a, int b, int order);
void species_remove_bond(struct species *s, int bond);
void species_set_element(struct species *s, int atom, int z);  /* pins of the atom are lifted */
void species_set_order(struct species *s, int bond, int order);
void species_set_place(struct species *s, int atom, int row, int col);
void species_set_pins(struct species *s, int atom, int pairs, int odd);
/* Both are cut to the limits above and marked as stated. */
void species_set_charge(struct species *s, int charge);
void species_set_multiplicity(struct species *s, int multiplicity);
void species_assume_multiplicity(struct species *s);
void species_set_name(struct species *s, const char *name);
void species_set_note(struct species *s, const char *note);
void species_add_stereo(struct species *s, const struct stereo *mark);

int species_bond_between(const struct species *s, int a, int b);  /* index or -1 */
int species_degree(const struct species *s, int atom);            /* neighbours, hydrogens included */
/* Fills neighbours (room for SPECIES_NEIGHBOURS_MAX) in bond order, gives the number; bonds may be NULL. */
int species_neighbours(const struct species *s, int atom, int *neighbours, int *bonds);
int species_valence_electrons(const struct species *s);           /* sum over atoms less charge; may be negative */
int species_heavy_atoms(const struct species *s);                 /* not hydrogen */
int species_lowest_multiplicity(const struct species *s);         /* 1 or 2, by parity */
bool species_has_unknown_valence(const struct species *s);        /* an f-block atom */
/* Connected parts: fills part[n_atoms] with 0.. and gives their number. */
int species_parts(const struct species *s, int *part);

/* Hill formula ("C2H6O", "HO4S"), without charge; the caller frees. */
char *species_formula(const struct species *s);
/* "S1": element symbol and 1-based index over the whole species. */
void species_label(const struct species *s, int atom, char label[16]);

/* NULL where every invariant holds, else one sentence (static text). */
const char *species_check(const struct species *s);

#endif
