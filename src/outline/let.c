/* SPDX-License-Identifier: GPL-3.0-or-later
 * muparser behind a list of names. Its own messages are not used: they go through buffers shared by
 * all threads. */
#include "outline/let.h"

#include <fenv.h>
#include <muParserDLL.h>
#include <stdio.h>
#include <string.h>

#include "base/degrees.h"
#include "base/memory.h"
#include "base/nearest.h"
#include "base/status.h"
#include "base/vec2.h"

enum { DEEPEST = 50 }; /* names that depend on one another; each level needs a parser */

typedef enum resolved { UNKNOWN, BEING_FOUND, KNOWN } resolved;

typedef struct dimension {
    char *name, *expression; /* owned; expression NULL: the value is given */
    double value;
    resolved state;
    int is_set; /* from outside */
} dimension;

struct utw_let {
    int n, capacity, depth;
    dimension *dimension;    /* [capacity], owned */
    muParserHandle_t parser; /* of depth 0, made when the first expression comes */
    /* while an expression is evaluated: */
    const char *expression;
    utw_error *err;
    utw_status failed; /* the first failure while muparser asks for names, told in *err */
    double zero;       /* what a name that failed stands for until muparser returns */
    int is_placed;     /* the message names its dimension already */
};

/* ---- functions of expressions ------------------------------------------------------------- */

static double least(const double *x, int n)
{
    double value = x[0];
    for (int i = 1; i < n; i++) value = x[i] < value ? x[i] : value;
    return value;
}

static double greatest(const double *x, int n)
{
    double value = x[0];
    for (int i = 1; i < n; i++) value = x[i] > value ? x[i] : value;
    return value;
}

static const struct {
    const char *name;
    muFun1_t call;
} function1[] = {
    {"sqrt", sqrt},
    {"abs", fabs},
    {"floor", floor},
    {"ceil", ceil},
    {"sin", utw_sin_degrees},
    {"cos", utw_cos_degrees},
    {"tan", utw_tan_degrees},
    {"asin", utw_asin_degrees},
    {"acos", utw_acos_degrees},
    {"atan", utw_atan_degrees},
};
static const struct {
    const char *name;
    muFun2_t call;
} function2[] = {{"hypot", hypot}, {"atan2", utw_atan2_degrees}};
static const struct {
    const char *name;
    muMultFun_t call;
} function_n[] = {{"min", least}, {"max", greatest}};

#define COUNT(array) (int)(sizeof(array) / sizeof(array)[0])

static int is_reserved(const char *name)
{
    int found = strcmp(name, "pi") == 0;
    for (int i = 0; i < COUNT(function1); i++) found |= strcmp(name, function1[i].name) == 0;
    for (int i = 0; i < COUNT(function2); i++) found |= strcmp(name, function2[i].name) == 0;
    for (int i = 0; i < COUNT(function_n); i++) found |= strcmp(name, function_n[i].name) == 0;
    return found;
}

/* ---- names -------------------------------------------------------------------------------- */

static int find(const utw_let *let, const char *name)
{
    for (int k = 0; k < let->n; k++)
        if (strcmp(let->dimension[k].name, name) == 0) return k;
    return -1;
}

static utw_status unknown_name(const utw_let *let, utw_status st, const char *name,
                               const char *before, utw_error *err)
{
    int near = -1;
    for (int k = 0, least_edits = 1000; k < let->n; k++) {
        const char *candidate = let->dimension[k].name;
        const int d = utw_word_distance(name, candidate);
        if (d >= least_edits || utw_nearest_word(name, &candidate, 1) < 0) continue;
        least_edits = d;
        near = k;
    }
    if (near >= 0)
        return utw_fail(err, st, "%sunknown name \"%.60s\"; did you mean \"%s\"?", before, name,
                        let->dimension[near].name);
    return utw_fail(err, st, "%sunknown name \"%.60s\"; define it in \"let\"", before, name);
}

static utw_status find_value(utw_let *let, int k, utw_error *err);

static utw_status find_name(utw_let *let, const char *name, int *k)
{
    *k = find(let, name);
    if (*k < 0) {
        char before[240];
        snprintf(before, sizeof before, "\"%.200s\" has the ", let->expression);
        return unknown_name(let, UTW_E_SYNTAX, name, before, let->err);
    }
    if (let->dimension[*k].state == BEING_FOUND)
        return utw_fail(let->err, UTW_E_SYNTAX,
                        "\"%.200s\" needs \"%s\", whose own value needs this one; break the circle",
                        let->expression, name);
    return find_value(let, *k, let->err);
}

/* muparser asks where the value of a name is. Failures wait in *let until it returns. */
static double *value_of_name(const char *name, void *data)
{
    utw_let *let = data;
    int k = -1;
    if (let->failed == UTW_OK) let->failed = find_name(let, name, &k);
    return let->failed == UTW_OK ? &let->dimension[k].value : &let->zero;
}

static muParserHandle_t new_parser(utw_let *let)
{
    muParserHandle_t parser = mupCreate(muBASETYPE_FLOAT);
    mupClearConst(parser);
    mupClearFun(parser);
    mupDefineConst(parser, "pi", UTW_PI);
    for (int i = 0; i < COUNT(function1); i++)
        mupDefineFun1(parser, function1[i].name, function1[i].call, 1);
    for (int i = 0; i < COUNT(function2); i++)
        mupDefineFun2(parser, function2[i].name, function2[i].call, 1);
    for (int i = 0; i < COUNT(function_n); i++)
        mupDefineMultFun(parser, function_n[i].name, function_n[i].call, 1);
    mupSetVarFactory(parser, value_of_name, let);
    return parser;
}

/* ---- expressions -------------------------------------------------------------------------- */

/* muparser would take "t = 5" for an assignment. */
static const char *assignment_in(const char *expression)
{
    for (const char *c = strchr(expression, '='); c != NULL; c = strchr(c + 1, '=')) {
        if (c[1] == '=') {
            c++;
            continue;
        }
        if (c == expression || strchr("<>!", c[-1]) == NULL) return c;
    }
    return NULL;
}

static utw_status not_understood(const char *expression, int at, utw_error *err)
{
    const int n = (int)strlen(expression);
    if (at < 0) at = 0;
    while (at < n && expression[at] == ' ') at++;
    if (at >= n)
        return utw_fail(err, UTW_E_SYNTAX, "\"%.200s\" ends too early; complete the expression",
                        expression);
    return utw_fail(err, UTW_E_SYNTAX,
                    "\"%.200s\" is not understood from its character %d on: \"%.40s\"", expression,
                    at + 1, expression + at);
}

/* One evaluation by a parser that nobody else is using; floating-point exceptions are clear. */
static utw_status run(utw_let *let, muParserHandle_t parser, const char *expression, double *value,
                      utw_error *err)
{
    int n = 0;
    mupErrorReset(parser);
    mupSetExpr(parser, expression);
    const double *result = mupError(parser) ? NULL : mupEvalMulti(parser, &n);
    if (let->failed != UTW_OK) return let->failed;
    if (mupError(parser) || result == NULL || n < 1)
        return not_understood(expression, mupGetErrorPos(parser), err);
    if (n > 1)
        return utw_fail(err, UTW_E_SYNTAX,
                        "\"%.200s\" has %d values; a decimal comma must be a point", expression, n);
    *value = result[0];
    /* the flags as well: 1/(1/0) is finite, and wrong */
    if (fetestexcept(FE_DIVBYZERO))
        return utw_fail(err, UTW_E_SYNTAX, "\"%.200s\" divides by zero", expression);
    if (fetestexcept(FE_INVALID) || isnan(*value))
        return utw_fail(err, UTW_E_SYNTAX,
                        "\"%.200s\" has no value (such as 0/0, or the root of a negative number)",
                        expression);
    if (fetestexcept(FE_OVERFLOW) || isinf(*value))
        return utw_fail(err, UTW_E_SYNTAX,
                        "\"%.200s\" is a number too large to be held (beyond 1.8e308)", expression);
    return UTW_OK;
}

static utw_status evaluate(utw_let *let, const char *expression, double *value, utw_error *err)
{
    double result = 0;
    if (expression[strspn(expression, " ")] == '\0')
        return utw_fail(err, UTW_E_SYNTAX, "the expression is empty");
    if (strlen(expression) > UTW_LONGEST_EXPRESSION)
        return utw_fail(err, UTW_E_SYNTAX, "\"%.60s...\" is longer than %d characters", expression,
                        UTW_LONGEST_EXPRESSION);
    const char *equals = assignment_in(expression);
    if (equals != NULL) return not_understood(expression, (int)(equals - expression), err);
    if (let->depth > DEEPEST)
        return utw_fail(err, UTW_E_SYNTAX,
                        "\"%.200s\": names depend on one another more than %d deep", expression,
                        DEEPEST);
    if (let->parser == NULL) let->parser = new_parser(let);
    muParserHandle_t parser = let->depth == 0 ? let->parser : new_parser(let);
    utw_error *const outer_err = let->err;
    const char *const outer_expression = let->expression;
    fexcept_t flags;
    fegetexceptflag(&flags, FE_ALL_EXCEPT);
    feclearexcept(FE_ALL_EXCEPT);
    let->err = err;
    let->expression = expression;
    let->depth++;
    const utw_status st = run(let, parser, expression, &result, err);
    let->depth--;
    let->err = outer_err;
    let->expression = outer_expression;
    fesetexceptflag(&flags, FE_ALL_EXCEPT);
    /* a parser keeps the names it has met, and those that failed stand for nothing */
    if (parser != let->parser || st != UTW_OK) mupRelease(parser);
    if (parser == let->parser && st != UTW_OK) let->parser = NULL;
    if (st == UTW_OK) *value = result;
    return st;
}

static utw_status find_value(utw_let *let, int k, utw_error *err)
{
    dimension *d = &let->dimension[k];
    if (d->state == KNOWN) return UTW_OK;
    d->state = BEING_FOUND;
    const utw_status st = evaluate(let, d->expression, &d->value, err);
    d->state = st == UTW_OK ? KNOWN : UNKNOWN;
    if (st != UTW_OK && !let->is_placed) {
        utw_error_prefix(err, "dimension \"%s\": ", d->name);
        let->is_placed = 1;
    }
    return st;
}

/* ---- the calls ---------------------------------------------------------------------------- */

utw_status utw_let_create(int capacity, utw_let **let, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_let *made = NULL;
    UTW_TRY_ALLOC(made = utw_alloc(1, sizeof *made));
    UTW_TRY_ALLOC(made->dimension = utw_alloc((size_t)capacity, sizeof *made->dimension));
    made->capacity = capacity;
    *let = made;
    made = NULL;
    st = UTW_OK;
done:
    utw_let_free(made);
    return st;
}

void utw_let_free(utw_let *let)
{
    if (let == NULL) return;
    for (int k = 0; k < let->n; k++) {
        utw_free(let->dimension[k].name);
        utw_free(let->dimension[k].expression);
    }
    if (let->parser != NULL) mupRelease(let->parser);
    utw_free(let->dimension);
    utw_free(let);
}

static int is_name(const char *name)
{
    static const char *const letters = "abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ",
                             *const others = "0123456789_";
    if (name[0] == '\0' || strchr(letters, name[0]) == NULL) return 0;
    for (const char *c = name; *c != '\0'; c++)
        if (strchr(letters, *c) == NULL && strchr(others, *c) == NULL) return 0;
    return strlen(name) <= UTW_LONGEST_DIMENSION;
}

utw_status utw_let_define(utw_let *let, const char *name, const char *expression, double number,
                          utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    if (!is_name(name))
        return utw_fail(err, UTW_E_SYNTAX,
                        "\"%.60s\" is no name for a dimension; use a letter, then letters, digits "
                        "and _, at most %d",
                        name, UTW_LONGEST_DIMENSION);
    if (is_reserved(name))
        return utw_fail(err, UTW_E_SYNTAX,
                        "\"%s\" already has a meaning in expressions; choose another name", name);
    if (find(let, name) >= 0)
        return utw_fail(err, UTW_E_SYNTAX, "dimension \"%s\" is defined twice; remove one", name);
    if (let->n == let->capacity)
        return utw_fail(err, UTW_E_INTERNAL, "more than %d dimensions", let->capacity);
    dimension d = {.value = number, .state = expression == NULL ? KNOWN : UNKNOWN};
    UTW_TRY_ALLOC(d.name = utw_copy_string(name));
    if (expression != NULL) UTW_TRY_ALLOC(d.expression = utw_copy_string(expression));
    let->dimension[let->n++] = d;
    d = (dimension){0};
    st = UTW_OK;
done:
    utw_free(d.name);
    return st;
}

utw_status utw_let_set(utw_let *let, const char *assignment, utw_error *err)
{
    char name[UTW_LONGEST_DIMENSION + 2] = "";
    const char *equals = strchr(assignment, '=');
    const size_t n = equals == NULL ? 0 : (size_t)(equals - assignment);
    if (n > 0 && n < sizeof name) memcpy(name, assignment, n);
    name[strcspn(name, " ")] = '\0';
    if (!is_name(name) || equals[1 + strspn(equals + 1, " ")] == '\0')
        return utw_fail(err, UTW_E_ARGUMENT, "\"%.100s\" must be NAME=VALUE, such as t=5",
                        assignment);
    const int k = find(let, name);
    if (k < 0) {
        char before[120];
        snprintf(before, sizeof before, "\"%.100s\": ", assignment);
        return unknown_name(let, UTW_E_ARGUMENT, name, before, err);
    }
    dimension *d = &let->dimension[k];
    if (d->is_set)
        return utw_fail(err, UTW_E_ARGUMENT, "\"%.100s\": \"%s\" is set twice", assignment, name);
    char *expression = utw_copy_string(equals + 1);
    if (expression == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (dimension)");
    utw_free(d->expression);
    d->expression = expression;
    d->state = UNKNOWN;
    d->is_set = 1;
    return UTW_OK;
}

utw_status utw_let_resolve(utw_let *let, utw_error *err)
{
    let->failed = UTW_OK;
    let->is_placed = 0;
    for (int k = 0; k < let->n; k++) {
        const utw_status st = find_value(let, k, err);
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}

utw_status utw_let_evaluate(utw_let *let, const char *expression, double *value, utw_error *err)
{
    let->failed = UTW_OK;
    let->is_placed = 1;
    return evaluate(let, expression, value, err);
}

int utw_let_count(const utw_let *let)
{
    return let->n;
}

const char *utw_let_name(const utw_let *let, int k)
{
    return let->dimension[k].name;
}

double utw_let_value(const utw_let *let, int k)
{
    return let->dimension[k].value;
}

int utw_let_is_set(const utw_let *let, int k)
{
    return let->dimension[k].is_set;
}
