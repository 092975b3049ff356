#include "config.h"

#include "cli/cli.h"

#include <stdio.h>
#include <string.h>

enum cli_outcome cli_run(int argc, char **argv, int *exit_status, const char **worksheet)
{
    (void)worksheet;
    if (argc == 2 && strcmp(argv[1], "--version") == 0) {
        puts(PACKAGE_STRING);
        *exit_status = EXIT_SOUND;
    } else {
        fputs("dotwright: only --version works so far\n", stderr);
        *exit_status = EXIT_CALL;
    }
    return CLI_DONE;
}
