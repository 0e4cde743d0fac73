/* SPDX-License-Identifier: GPL-3.0-or-later
 * The thickness study in the report for people. */
#ifndef UTW_REPORT_TEXT_STUDY_H
#define UTW_REPORT_TEXT_STUDY_H

#include "base/text.h"
#include "untwist.h"

/** The table of the study and its limits; nothing when the report has none. */
void utw_report_text_study(const utw_report *report, utw_text *text);

#endif
