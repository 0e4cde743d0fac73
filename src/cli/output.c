/* SPDX-License-Identifier: GPL-3.0-or-later
 * Where commands that solve a section write their reports. */
#include "cli/output.h"

#include <string.h>
#include <sys/stat.h>

#include "cli/message.h"

/* 1 when both paths are the same file. */
static int same_file(const char *a, const char *b)
{
    struct stat sa, sb;
    if (stat(a, &sa) != 0 || stat(b, &sb) != 0) return 0;
    return sa.st_dev == sb.st_dev && sa.st_ino == sb.st_ino;
}

int cli_to_output(const cli_call *call, const char *option)
{
    const char *path = cli_text(call, option);
    return path != NULL && strcmp(path, "-") == 0;
}

int cli_check_overwrite(const cli_call *call, const char *option)
{
    const char *path = cli_text(call, option);
    if (path == NULL || cli_to_output(call, option) || !same_file(path, call->operand[0]))
        return CLI_DONE;
    cli_message("%s: --%s %s would overwrite the section file", call->command->name, option, path);
    return CLI_USAGE;
}

int cli_write_report(cli_report_writer writer, const utw_report *report, const char *path)
{
    utw_error err;
    char *text = NULL;
    if (writer(report, &text, &err) != UTW_OK) return cli_fail(&err);
    const int status = cli_write(path, text);
    utw_report_free(text);
    return status;
}
