/* dotwright: the map of src/
 *
 *   base/    allocation, text, error records, exact counts
 *   core/    elements; the species: atoms, bonds, charge, multiplicity
 *   graph/   components, orbits, canonical labels of coloured graphs (nauty)
 *   lewis/   electron arrangements: count, rank, judge, mend
 *   shape/   domains, angles, lengths, coordinates, symmetry (GSL)
 *   engine/  answer_make(): all of the above for one species; undo history
 *   format/  readers and writers, a file each (cJSON)
 *   cli/     options, verbs, stream, exit status
 *   tui/     the workbench: state, panes, canvas, terminal (curses)
 *
 * Each folder may include those above it in this list and nothing below;
 * cli and tui do not know each other. */
#include "config.h"

#include "cli/cli.h"
#include "tui/tui.h"

#include <locale.h>

int main(int argc, char **argv)
{
    int exit_status = EXIT_SOUND;
    const char *worksheet = NULL;

    /* Only the character set: a comma locale must not turn 1.5 into "1,5". */
    setlocale(LC_CTYPE, "");
    if (cli_run(argc, argv, &exit_status, &worksheet) == CLI_WORKBENCH)
        return tui_run(worksheet);
    return exit_status;
}
