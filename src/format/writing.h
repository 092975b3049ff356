/* Giving answers out: records, reports, geometries. Writers only read. */
#ifndef DW_FORMAT_WRITING_H
#define DW_FORMAT_WRITING_H

#include "base/error.h"
#include "base/text.h"
#include "engine/answer.h"

#include <stdbool.h>

/* Which parts of an output record to write. */
enum {
    PART_TALLY = 1, /* electrons, verdict, findings, mends, atoms' electrons */
    PART_FORMS = 2, /* forms, bonds' mean orders, the listed forms */
    PART_SHAPE = 4, /* domains, lengths, angles, group, bands, rotor, dipole */
    PART_PLACE = 8, /* geometry */
    PART_ALL = 15
};

/* One output record of the contract on one line, without a newline. Numbers are
 * finite; an unknown one is null. list_forms: also a key "forms_listed". */
void record_write(const struct answer *a, const char *id, unsigned parts, struct text *out);
/* The record for input that could not be read. */
void record_write_error(const char *id, const struct error *err, struct text *out);

/* XYZ, ångström: comment "charge=Q multiplicity=M name=...". */
void xyz_write(const struct answer *a, struct text *out);
/* QCSchema molecule, bohr, with connectivity (mean orders), provenance, fix_com and fix_orientation. */
void qcschema_write(const struct answer *a, struct text *out);
/* The text report, as the verbs print it: plain ASCII where ascii is set. */
void report_write(const struct answer *a, unsigned parts, bool ascii, struct text *out);

/* Replaces path by bytes as a whole or not at all: a new file beside it, fsync,
 * rename; mode and link target of an existing file are kept. */
enum status file_replace(const char *path, const char *bytes, size_t length, struct error *err);

#endif
