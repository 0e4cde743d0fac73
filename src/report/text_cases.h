/* SPDX-License-Identifier: GPL-3.0-or-later
 * The load cases in the report for people. */
#ifndef UTW_REPORT_TEXT_CASES_H
#define UTW_REPORT_TEXT_CASES_H

#include "base/text.h"
#include "report/report.h"

/** The tables of the load cases, of their envelope and of the probes; nothing when the report has
 * no cases. */
void utw_report_text_cases(const utw_report *report, utw_text *text);

/** The notes below: cases left out, corners without bound, what the errors mean. */
void utw_report_note_cases(const utw_report *report, utw_text *text);

/** Where stresses have no bound, and what is given instead, in words. */
void utw_report_corners(const utw_stress *stress, utw_text *words);

#endif
