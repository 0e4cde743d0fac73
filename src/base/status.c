/* SPDX-License-Identifier: GPL-3.0-or-later
 * Statuses, messages and the places they speak of. */
#include "base/status.h"

#include <stdarg.h>
#include <stdio.h>
#include <string.h>

void utw_error_clear(utw_error *err)
{
    if (err == NULL) return;
    memset(err, 0, sizeof *err);
    err->status = UTW_OK;
    err->part = err->loop = err->vertex = err->line = err->column = -1;
}

utw_status utw_fail(utw_error *err, utw_status status, const char *format, ...)
{
    if (err == NULL) return status;
    utw_error_clear(err);
    err->status = status;
    va_list args;
    va_start(args, format);
    vsnprintf(err->text, sizeof err->text, format, args);
    va_end(args);
    return status;
}

void utw_error_place(utw_error *err, int part, int loop, int vertex)
{
    if (err == NULL) return;
    err->part = part;
    err->loop = loop;
    err->vertex = vertex;
}

void utw_error_prefix(utw_error *err, const char *format, ...)
{
    if (err == NULL) return;
    char text[2 * sizeof err->text];
    va_list args;
    va_start(args, format);
    vsnprintf(text, sizeof err->text, format, args);
    va_end(args);
    const size_t n = strlen(text);
    memcpy(text + n, err->text, strlen(err->text) + 1);
    text[sizeof err->text - 1] = '\0';
    memcpy(err->text, text, strlen(text) + 1);
}

const char *utw_status_text(utw_status status)
{
    switch (status) {
    case UTW_OK: return "done";
    case UTW_E_ARGUMENT: return "wrong argument";
    case UTW_E_NOMEM: return "out of memory";
    case UTW_E_FILE: return "file cannot be read or written";
    case UTW_E_SYNTAX: return "not a section file";
    case UTW_E_OUTLINE: return "outline is wrong";
    case UTW_E_MATERIAL: return "material is missing or wrong";
    case UTW_E_LOAD: return "load or support is wrong";
    case UTW_E_MESH: return "no mesh could be made";
    case UTW_E_SINGULAR: return "system of equations is singular";
    case UTW_E_NO_THIN_WALL: return "no thin-walled idealisation";
    case UTW_E_INTERNAL: return "internal error";
    case UTW_E_UNBOUNDED: return "stress has no bound at a sharp re-entrant corner";
    }
    return "unknown status";
}
