/* Taking species in: files, texts and records. Readers never solve anything. */
#ifndef DW_FORMAT_READING_H
#define DW_FORMAT_READING_H

#include "base/error.h"
#include "base/text.h"
#include "core/species.h"

#include <stdbool.h>
#include <stddef.h>

enum {
    READING_BYTES_MAX = 64 * 1024 * 1024, /* of one file or of standard input */
    READING_LINE_MAX = 1024 * 1024,       /* of one SMILES line or one stream record */
    READING_DEPTH_MAX = 200               /* nesting of JSON, branches of SMILES */
};

enum reading_kind {
    READING_WORKSHEET, /* dotwright worksheet JSON */
    READING_QCSCHEMA,  /* qcschema_molecule JSON */
    READING_RECORDS,   /* JSON input records, one a line (contract) */
    READING_XYZ,       /* Cartesian XYZ: told apart, not read by this version */
    READING_SMILES     /* lines of SMILES, an optional name after a blank */
};

/* One species taken in, or why it was not. */
struct reading_item {
    struct species *species; /* NULL where error says why */
    char *id;                /* id of a record, name of a worksheet species or SMILES line; never NULL */
    struct error error;
};

struct reading {
    enum reading_kind kind;
    struct reading_item *items;
    int n;
};

void reading_done(struct reading *r); /* frees what it holds */

/* Reads a regular file, or standard input for "-", into bytes (initialised by
 * the caller). Directories, devices and files over the limit are refused. */
enum status reading_load(struct text *bytes, const char *path, struct error *err);

/* Tells the kind from the contents and takes in every species. Not ST_OK only
 * where nothing could be told apart; errors of single items are in the items. */
enum status reading_parse(struct reading *r, const char *bytes, size_t length, struct error *err);

/* One SMILES (OpenSMILES grammar) up to the end, a blank or a tab. Hydrogens
 * become real atoms after all heavy atoms, in the order of the atoms that carry
 * them. Charge is the sum of the atoms' charges and counts as stated. The
 * multiplicity stays assumed. NULL and err (with the 1-based column) on failure. */
struct species *smiles_read(const char *smiles, size_t length, struct error *err);

/* One input record of the stream (contract): NULL and err where it cannot be
 * read; *id is always set (the caller frees; "" where the record has none). */
struct species *record_read(const char *json, size_t length, char **id, struct error *err);

/* Gives a place on the sketch grid to every atom that has none, hydrogens on
 * heavier atoms left out (the sketch folds an unplaced hydrogen into its
 * neighbour's label: CH3). row and col count grid nodes, each with eight
 * neighbours; bonded atoms come to neighbouring nodes as far as the graph
 * allows, no two atoms on one node. Stable: the same input, the same layout. */
void layout_place(struct species *s);

#endif
