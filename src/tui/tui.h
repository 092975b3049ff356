/* The full-screen workbench. */
#ifndef DW_TUI_TUI_H
#define DW_TUI_TUI_H

/* Opens the workbench on a worksheet file (NULL: the demo worksheet) and runs
 * it until the user leaves. Gives the exit status. */
int tui_run(const char *path);

#endif
