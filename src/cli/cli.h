/* Verbs, options and exit status of the command line. */
#ifndef DW_CLI_CLI_H
#define DW_CLI_CLI_H

enum cli_exit { EXIT_SOUND = 0, EXIT_JUDGED = 1, EXIT_CALL = 2, EXIT_UNREAD = 3 };

/* What the call asks for. */
enum cli_outcome {
    CLI_DONE,      /* all was done here; *exit_status holds the status */
    CLI_WORKBENCH  /* open the workbench on *worksheet (NULL: the demo) */
};

enum cli_outcome cli_run(int argc, char **argv, int *exit_status, const char **worksheet);

#endif
