/* SPDX-License-Identifier: GPL-3.0-or-later
 *
 * untwist: the constants of a bar's cross-section with two-sided bounds, where to load it so that it bends
 * and does not twist, what happens when it is loaded elsewhere, and the stresses.
 *
 * CONVENTIONS (they hold for every function below; docs/theory.md defines every quantity)
 *
 *   Axes      x to the right, y up in the plane of the section, z along the bar, right-handed.
 *   Signs     N > 0 is tension. Vx, Vy are the shear forces on the face whose outward normal is +z.
 *             T > 0 turns x toward y. Mx = int sigma y dA, My = - int sigma x dA.
 *   Units     one length [L] and one force [F], those of the section file; nothing is converted. Angles in
 *             the C API are radians. Each value states its dimension, such as [L^4] or [F/L^2].
 *   Indices   0-based. Arrays are row-major, shapes are written slowest index first: xy[n][2].
 *   Ownership "borrowed": the callee keeps no reference after it returns; "returned owned": the caller
 *             frees it with the matching _free; "returned borrowed": it lives as long as the object.
 *   Order     object, inputs, options, outputs, error last. The error may be NULL.
 *   Failure   a status other than UTW_OK leaves the outputs untouched and the inputs unchanged. The library
 *             never prints, never exits and has no global state. Gmsh has: only one thread at a time may be
 *             inside utw_solve() or any other function whose comment names the mesher.
 */
#ifndef UNTWIST_H
#define UNTWIST_H

#include <stddef.h>

#ifdef __cplusplus
extern "C" {
#endif

#if defined(__GNUC__)
#define UTW_API __attribute__((visibility("default")))
#define UTW_CHECK __attribute__((warn_unused_result))
#else
#define UTW_API
#define UTW_CHECK
#endif

/* ---- statuses and errors ------------------------------------------------------------------------ */

/** What became of a call. The numbers are stable. */
typedef enum utw_status {
    UTW_OK = 0,
    UTW_E_ARGUMENT = 1,      /* a NULL, a wrong size, an option out of range */
    UTW_E_NOMEM = 2,         /* memory ran out */
    UTW_E_FILE = 3,          /* a file cannot be opened, read or written */
    UTW_E_SYNTAX = 4,        /* not JSON, or not what a section file may hold */
    UTW_E_OUTLINE = 5,       /* loops that cross, do not close, lie outside, are too small ... */
    UTW_E_MATERIAL = 6,      /* a material that is missing or impossible */
    UTW_E_LOAD = 7,          /* a load, probe or support that is impossible */
    UTW_E_MESH = 8,          /* no valid mesh could be made */
    UTW_E_SINGULAR = 9,      /* the equations could not be factorised */
    UTW_E_NO_THIN_WALL = 10, /* the section has no thin-walled idealisation */
    UTW_E_INTERNAL = 11,     /* a fault of the library itself */
    UTW_E_UNBOUNDED = 12     /* a stress without bound: a sharp re-entrant corner */
} utw_status;

/** A status with its message and the place it speaks of. Owned by the caller; places are 0-based and -1
 *  when they do not apply. The text counts parts, holes and vertices from 1, as people do. */
typedef struct utw_error {
    utw_status status;
    char text[640];
    int part, loop, vertex; /* loop 0 is the outline, 1.. the holes */
    int line, column;       /* of the file, 1-based */
} utw_error;

/** A short English text for a status. Returned borrowed, never NULL. */
UTW_API const char *utw_status_text(utw_status status);

/** The version of the library, such as "0.1.0". Returned borrowed. */
UTW_API const char *utw_version(void);

/** Name and version of the library that factorises, such as "CHOLMOD 3.0.14", as loaded. [out] text[n],
 *  cut short when n is too small. */
UTW_API void utw_solver_version(char *text, size_t n);

/** Name and version of the mesher, such as "Gmsh 4.8.4", as loaded. Calls the mesher. */
UTW_API void utw_mesher_version(char *text, size_t n);

/* ---- the section: what is given ------------------------------------------------------------------ */

/** A cross-section as drawn: parts, materials, loads; checked when it is read. */
typedef struct utw_outline utw_outline;

/** Read a section file (docs/section-file.md). [in] path, borrowed: "-" is standard input.
 *  [out] *outline, returned owned: utw_outline_free().
 *  UTW_E_FILE, UTW_E_SYNTAX, UTW_E_OUTLINE, UTW_E_MATERIAL, UTW_E_LOAD, UTW_E_NOMEM; the message names file,
 *  part, loop, vertex and remedy. */
UTW_API UTW_CHECK utw_status utw_outline_read(const char *path, utw_outline **outline, utw_error *err);

/** The same from text[n] in memory; `name` stands for the file in messages, and files the section names
 *  (docs/shapes.md, aerofoil) are looked for in its folder. */
UTW_API UTW_CHECK utw_status utw_outline_parse(const char *text, size_t n, const char *name,
                                               utw_outline **outline, utw_error *err);

/** The same two with named dimensions of the file ("let") given other values. [in] set[n_set], borrowed, each
 *  "NAME=VALUE" such as "t=5"; the value may be an expression. UTW_E_ARGUMENT when one is not of this form, names
 *  no dimension of the file, or sets one twice. */
UTW_API UTW_CHECK utw_status utw_outline_read_with(const char *path, int n_set, const char *const *set,
                                                   utw_outline **outline, utw_error *err);
UTW_API UTW_CHECK utw_status utw_outline_parse_with(const char *text, size_t n, const char *name, int n_set,
                                                    const char *const *set, utw_outline **outline,
                                                    utw_error *err);

/** The number of named dimensions. */
UTW_API int utw_outline_dimension_count(const utw_outline *outline);

/** The k-th named dimension: its name, returned borrowed, NULL when k is out of range. [out] *value and
 *  *is_set (1: set by the caller, 0: by the file); either may be NULL. */
UTW_API const char *utw_outline_dimension(const utw_outline *outline, int k, double *value, int *is_set);

/** Free an outline; NULL is allowed. */
UTW_API void utw_outline_free(utw_outline *outline);

/** The name in the file ("" when it has none). Returned borrowed. */
UTW_API const char *utw_outline_name(const utw_outline *outline);

/** The units in the file, such as "mm N". Returned borrowed. */
UTW_API const char *utw_outline_units(const utw_outline *outline);

/* ---- trade shapes -------------------------------------------------------------------------------- */

/** What a dimension of a trade shape is measured in. */
typedef enum utw_shape_unit {
    UTW_SHAPE_IN_LENGTH = 0, /* [L] */
    UTW_SHAPE_IN_DEGREES = 1, /* dimensions are as on a drawing, so degrees here too */
    UTW_SHAPE_IN_PER_CENT = 2,
    UTW_SHAPE_IN_COUNT = 3 /* a whole number */
} utw_shape_unit;

/** A named dimension of a trade shape. */
typedef struct utw_shape_dimension {
    const char *key;      /* such as "tf" */
    const char *meaning;  /* in a few words */
    utw_shape_unit unit;
    int required;         /* 1: it must be given */
    double fallback;      /* its value when it is not given; NAN when that depends on others */
    const char *otherwise; /* that value in words, such as "b/2"; "" when it is `fallback` or required */
    double least, greatest; /* allowed range on its own; the other dimensions may narrow it */
    int more;             /* 1: it must be more than `least`, not equal */
} utw_shape_dimension;

/** A trade shape as the list shows it. All text is returned borrowed and lives for ever. */
typedef struct utw_shape_info {
    const char *name;    /* such as "channel" */
    const char *meaning; /* what it is, in a few words */
    const char *origin;  /* where the origin of its coordinates lies */
    const char *drawing; /* a dimensioned sketch in text, several lines */
    int n_dimension;
    const utw_shape_dimension *dimension; /* [n_dimension] */
} utw_shape_info;

/** Where a shape is put: first mirrored (x to -x), then turned, then shifted. */
typedef struct utw_placement {
    double at[2]; /* where the shape's origin goes [L] */
    double turn;  /* counter-clockwise [rad]; quarter turns are exact */
    int mirror;   /* 1: mirrored */
} utw_placement;

/** How many trade shapes there are. */
UTW_API int utw_shape_count(void);

/** Shape `index` of the list. [out] *info. UTW_E_ARGUMENT when out of range. */
UTW_API UTW_CHECK utw_status utw_shape_get_info(int index, utw_shape_info *info, utw_error *err);

/** An outline from a trade shape (docs/shapes.md), without material and loads. [in] name; keys[n] and values[n], the
 *  dimensions; units, such as "mm N", as in a section file; placement (NULL: the shape's own coordinates); all
 *  borrowed. [out] *outline, returned owned: utw_outline_free().
 *  UTW_E_SYNTAX: unknown shape, unknown, missing or repeated dimension, bad units. UTW_E_OUTLINE: a value out of
 *  range, or one that does not fit the others: the message names the dimension, its value and its limit.
 *  UTW_E_ARGUMENT, UTW_E_NOMEM. */
UTW_API UTW_CHECK utw_status utw_outline_from_shape(const char *name, int n, const char *const *keys,
                                                    const double *values, const char *units,
                                                    const utw_placement *placement,
                                                    utw_outline **outline, utw_error *err);

/* ---- midlines ------------------------------------------------------------------------------------ */

/** One wall of a midline: straight, or a circular arc; its thickness changes linearly along it. */
typedef struct utw_wall {
    int from, to;  /* indices of its nodes; the direction in which its stations and flows are counted */
    double t0, t1; /* thickness at `from` and at `to` [L], > 0 */
    int arc;       /* 0: straight; 1: an arc through `mid` */
    double mid[2]; /* a point of the arc, best its mid-point [L]; not read when arc is 0. With from = to, or
                      ends at the same place, it is the point opposite, and the wall is a full circle,
                      run counter-clockwise. */
} utw_wall;

/** The thin-walled idealisation of a section: lines with thickness that meet at nodes; open, closed, with
 *  any number of cells and fins. Different nodes at the same place are not joined: that is a slit. At most
 *  4096 nodes and walls. */
typedef struct utw_midline {
    int n_nodes, n_walls;
    double (*nodes)[2]; /* [n_nodes] x, y [L] */
    utw_wall *walls;    /* [n_walls] */
} utw_midline;

/** An outline from a midline: its walls with their thickness, corners mitred, ends square, cells as holes (docs/section-file.md).
 *  [in] midline, copied; units, such as "mm N", borrowed. [out] *outline, returned owned: utw_outline_free(). It has
 *  no material and no loads.
 *  UTW_E_ARGUMENT, UTW_E_NOMEM; UTW_E_OUTLINE as utw_thin_solve(), and two nodes in one place, a wall too short
 *  or an arc too narrow for its thickness, walls that run into one another: the message names walls (from 1) and
 *  nodes (from 0), err->vertex is the index of one of them. */
UTW_API UTW_CHECK utw_status utw_outline_from_midline(const utw_midline *midline, const char *units,
                                                      utw_outline **outline, utw_error *err);

/** The midline an outline was drawn by; NULL when it was not drawn by one. Returned borrowed. */
UTW_API const utw_midline *utw_outline_midline(const utw_outline *outline);

/* ---- constants ----------------------------------------------------------------------------------- */

/** How far a number can be trusted. */
typedef enum utw_trust {
    UTW_EXACT = 0,   /* closed boundary integral: exact to rounding; low = high = value */
    UTW_BRACKET = 1, /* two-sided bounds from two independent variational solutions */
    UTW_ESTIMATE = 2 /* low and high from the change between two orders: an estimate, not a bound */
} utw_trust;

/** A number with its bounds and their kind. */
typedef struct utw_quantity {
    double value, low, high;
    utw_trust trust;
} utw_quantity;

/** The constants of a section. Second moments and what follows from them are about the centroid, in the
 *  directions of the drawing's axes. docs/theory.md defines each. */
typedef enum utw_constant {
    UTW_A = 0,     /* area [L^2] */
    UTW_PERIMETER, /* length of all loops, holes included [L] */
    UTW_XC,        /* centroid, in the drawing's coordinates [L] */
    UTW_YC,
    UTW_IXX, /* int y^2 dA [L^4] */
    UTW_IYY, /* int x^2 dA [L^4] */
    UTW_IXY, /* int x y dA [L^4] */
    UTW_I1,  /* greater principal second moment [L^4] */
    UTW_I2,  /* smaller one [L^4] */
    UTW_ANGLE, /* from the x axis to the axis of I1, counter-clockwise, in (-pi/2, pi/2] [rad] */
    UTW_RX,    /* radii of gyration sqrt(Ixx/A), sqrt(Iyy/A) [L] */
    UTW_RY,
    UTW_WX_TOP, /* elastic moduli Ixx / distance of the extreme fibre [L^3] */
    UTW_WX_BOTTOM,
    UTW_WY_LEFT,
    UTW_WY_RIGHT,
    UTW_ZX, /* plastic moduli about the axes parallel to x and y that halve the area [L^3] */
    UTW_ZY,
    UTW_XP, /* where those axes lie: the plastic neutral axes x = xp, y = yp [L] */
    UTW_YP,
    UTW_J,  /* Saint-Venant torsion constant [L^4] */
    UTW_WT, /* torsion modulus T / greatest torsional shear stress [L^3] */
    UTW_XS, /* shear centre (energy definition, free of Poisson's ratio), drawing's coordinates [L] */
    UTW_YS,
    UTW_XF, /* centre of flexure at the material's Poisson's ratio (mean twist zero) [L] */
    UTW_YF,
    UTW_IW,  /* warping constant about the shear centre [L^6] */
    UTW_ASX, /* shear areas V^2 / int |tau|^2 dA, load through the shear centre [L^2] */
    UTW_ASY,
    UTW_KX, /* shear factors Asx/A, Asy/A [1] */
    UTW_KY,
    UTW_BETAX, /* monosymmetry (Wagner) coefficients [L] */
    UTW_BETAY,
    UTW_R0, /* polar radius about the shear centre [L] */
    UTW_CONSTANT_COUNT
} utw_constant;

/** Key of a constant in results, such as "Ixx". Returned borrowed; NULL when `which` is out of range. */
UTW_API const char *utw_constant_key(utw_constant which);

/** What it is, in a few words. Returned borrowed; NULL when out of range. */
UTW_API const char *utw_constant_meaning(utw_constant which);

/** Its dimension as a power of the length; angles and factors are 0. */
UTW_API int utw_constant_power(utw_constant which);

/* ---- the solid solution -------------------------------------------------------------------------- */

/** Told of every round of a solution. [in] user: the pointer of the options; round: from 1; unknowns of one
 *  problem; gap: (J_high - J_low)/J so far. It must not call the library. */
typedef void (*utw_progress)(void *user, int round, int unknowns, double gap);

/** How to solve. Start from UTW_OPTIONS_INIT. */
typedef struct utw_options {
    int version;       /* 1 */
    double tolerance;  /* stop when (J_high - J_low)/J is at most this; 1e-12 .. 0.5 */
    int fixed_order;   /* 0: orders are chosen element by element; 1..12: this order everywhere, once */
    int max_rounds;    /* at most so many solutions */
    int max_unknowns;  /* give up refining beyond so many unknowns of one problem */
    double mesh_scale; /* factor on the element size that follows from the wall thickness; 1 */
    utw_progress progress; /* called after every round; NULL: nobody is told */
    void *user;            /* handed to progress */
} utw_options;

#define UTW_OPTIONS_INIT {1, 1e-6, 0, 12, 2000000, 1.0, NULL, NULL}

/** The solved section. */
typedef struct utw_solution utw_solution;

/** Solve torsion and flexure of a section. [in] outline, borrowed; it must outlive the solution.
 *  [in] options, borrowed; NULL for the defaults. [out] *solution, returned owned: utw_solution_free().
 *  Calls the mesher. When the tolerance is not reached the status is still UTW_OK and
 *  utw_solution_info() says so: the brackets hold all the same.
 *  Sources: docs/theory.md (Prager and Synge 1947; Trefftz 1935; Szabo and Babuska 1991).
 *  UTW_E_ARGUMENT, UTW_E_NOMEM, UTW_E_MESH, UTW_E_SINGULAR; UTW_E_MATERIAL when only some parts have a
 *  material. */
UTW_API UTW_CHECK utw_status utw_solve(const utw_outline *outline, const utw_options *options,
                                       utw_solution **solution, utw_error *err);

/** Free a solution; NULL is allowed. */
UTW_API void utw_solution_free(utw_solution *solution);

/** One constant. [out] *quantity. UTW_E_ARGUMENT when out of range; UTW_E_MATERIAL when the constant needs
 *  a Poisson's ratio (xf, yf, Asx, Asy, kx, ky) and the section has no material. */
UTW_API UTW_CHECK utw_status utw_solution_constant(const utw_solution *solution, utw_constant which,
                                                   utw_quantity *quantity, utw_error *err);

/** Stiffnesses of the bar: moduli times constants. With parts of different materials, bonded where they
 *  touch, they are int E dA, int E y^2 dA and so on; the constants are then these over the moduli of the
 *  first part's material, the centroid is the E-weighted one, and what needs one material (W, Z, Wt, centre
 *  of flexure, shear areas) is absent. Different Poisson's ratios strain each other sideways: that is left
 *  out, as beam theory does. */
typedef enum utw_stiffness {
    UTW_STIFFNESS_EA = 0, /* [F] */
    UTW_STIFFNESS_EIXX,   /* about the weighted centroid [F L^2] */
    UTW_STIFFNESS_EIYY,
    UTW_STIFFNESS_EIXY,
    UTW_STIFFNESS_GJ,  /* [F L^2] */
    UTW_STIFFNESS_EIW, /* about the shear centre [F L^4] */
    UTW_STIFFNESS_COUNT
} utw_stiffness;

/** Key such as "EIxx"; NULL when out of range. */
UTW_API const char *utw_stiffness_key(utw_stiffness which);

/** The constant it belongs to; UTW_CONSTANT_COUNT when out of range. */
UTW_API utw_constant utw_stiffness_constant(utw_stiffness which);

/** One stiffness. UTW_E_ARGUMENT when out of range, UTW_E_MATERIAL without material. */
UTW_API UTW_CHECK utw_status utw_solution_stiffness(const utw_solution *solution, utw_stiffness which,
                                                    utw_quantity *quantity, utw_error *err);

/** 1 when parts differ in E or in Poisson's ratio. */
UTW_API int utw_solution_composite(const utw_solution *solution);

/** What the solution took. */
typedef struct utw_solution_info {
    int least_order, greatest_order; /* of the elements */
    int triangles;
    int unknowns;      /* of the warping problem, element interiors included */
    int skeleton;      /* of them left after condensation */
    int rounds;        /* solutions */
    double gap;        /* (J_high - J_low)/J */
    double tolerance;  /* asked for */
    int reached;       /* 1 when gap <= tolerance */
    /* wall clock: reading the drawing, meshing, solving, and all of it */
    double seconds_read, seconds_mesh, seconds_solve, seconds_total;
} utw_solution_info;

/** Fill *info. */
UTW_API void utw_solution_get_info(const utw_solution *solution, utw_solution_info *info);

/* ---- stresses ------------------------------------------------------------------------------------ */

/** What acts on the section: the stress resultants of one load case, on the face whose normal is +z. N and the
 *  moments are about the centroid. T is the torque of uniform torsion. */
typedef struct utw_forces {
    double N, Vx, Vy; /* [F] */
    double Mx, My, T; /* [F L] */
    double B;         /* bimoment int sigma omega dA [F L^2] */
    int has_at;       /* 0: Vx and Vy act at the shear centre (energy definition); 1: at the place below, and bring
                         the torque Vy (at x - xs) - Vx (at y - ys) */
    double at[2];     /* in the drawing's coordinates [L] */
} utw_forces;

/** The number of load cases of an outline. */
UTW_API int utw_outline_load_count(const utw_outline *outline);

/** The k-th load case: its name, returned borrowed, NULL when k is out of range. [out] *forces; may be NULL. */
UTW_API const char *utw_outline_load(const utw_outline *outline, int k, utw_forces *forces);

/** The stresses of a solved section under any load: the stresses of unit forces, prepared once, so that a load
 *  case costs a sum. */
typedef struct utw_stress utw_stress;

/** Prepare. [in] solution, borrowed; it must outlive the stresses. [out] *stress, returned owned:
 *  utw_stress_free(). UTW_E_ARGUMENT; UTW_E_MATERIAL when the parts have different moduli of elasticity;
 *  UTW_E_NOMEM. */
UTW_API UTW_CHECK utw_status utw_stress_create(const utw_solution *solution, utw_stress **stress, utw_error *err);

/** Free it; NULL is allowed. */
UTW_API void utw_stress_free(utw_stress *stress);

/** The stress at a point. Other components than these three are zero in this theory (Saint-Venant). */
typedef struct utw_stress_point {
    double at[2];                        /* the place, in the drawing's coordinates [L] */
    double sigma_z, tau_xz, tau_yz;      /* [F/L^2] */
    double tau;                          /* sqrt(tau_xz^2 + tau_yz^2) */
    double von_mises;                    /* sqrt(sigma_z^2 + 3 tau^2) */
    double principal_max, principal_min; /* sigma_z/2 +- sqrt(sigma_z^2/4 + tau^2) */
    double omega;                        /* warping function about the shear centre, mean 0 [L^2] */
    double sigma_error, tau_error;       /* estimated errors of sigma_z and of (tau_xz, tau_yz): see below */
    int kept_out;                        /* 1: in the circle around a sharp re-entrant corner while shear or torsion
                                            acts: the stress here depends on a radius that is not drawn */
} utw_stress_point;

/** The stress of a load at a point of the section, found in the mesh without solving again. The shear stress is the
 *  mean of two independent solutions, one from displacements and one in equilibrium; tau_error is twice their
 *  distance at the point, plus what the brackets of J and of the shear centre add: an estimate, not a bound.
 *  sigma_error is not zero with a bimoment only. Points outside by less than 1e-5 of the section's size are moved to
 *  the boundary. Methods: docs/stress.md.
 *  UTW_E_ARGUMENT; UTW_E_LOAD when the point lies outside the section (the message names the nearest point of it),
 *  when a number is not finite, or for a bimoment on a section that does not warp; UTW_E_MATERIAL for a shear force
 *  when there is no Poisson's ratio. */
UTW_API UTW_CHECK utw_status utw_stress_at(const utw_stress *stress, const utw_forces *forces, const double at[2],
                                           utw_stress_point *point, utw_error *err);

/** Kinds of greatest stresses. */
typedef enum utw_stress_kind {
    UTW_VON_MISES = 0,
    UTW_PRINCIPAL_MAX, /* greatest tension */
    UTW_PRINCIPAL_MIN, /* greatest compression: the least principal stress */
    UTW_SIGMA_MAX,     /* greatest and least sigma_z */
    UTW_SIGMA_MIN,
    UTW_TAU_MAX, /* greatest shear stress on the section, sqrt(tau_xz^2 + tau_yz^2) */
    UTW_STRESS_KIND_COUNT
} utw_stress_kind;

/** Key of a kind in results, such as "von_mises". Returned borrowed; NULL when out of range. */
UTW_API const char *utw_stress_kind_key(utw_stress_kind kind);

/** A greatest stress: its value [F/L^2], the estimated error of the value, its place [L]. */
typedef struct utw_stress_peak {
    double value, error;
    double at[2];
} utw_stress_peak;

/** The greatest stresses of one load case anywhere in the section, found on the elements' polynomials. */
typedef struct utw_stress_peaks {
    utw_stress_peak peak[UTW_STRESS_KIND_COUNT];
    double margin; /* yield stress over the greatest von Mises stress, minus 1 (the least over all parts); NaN when a
                      part has no yield stress, infinite when nothing acts */
    int unbounded; /* 1: shear or torsion acts and the section has sharp re-entrant corners, where these stresses have
                      no bound. All but sigma_z are then those outside the circles of utw_stress_corner() */
} utw_stress_peaks;

/** Find them. Statuses as of utw_stress_at(). */
UTW_API UTW_CHECK utw_status utw_stress_peaks_of(const utw_stress *stress, const utw_forces *forces,
                                                 utw_stress_peaks *peaks, utw_error *err);

/** For every kind the greatest over n load cases, and the case it belongs to; the least margin. */
typedef struct utw_stress_envelope {
    utw_stress_peak peak[UTW_STRESS_KIND_COUNT];
    int governing[UTW_STRESS_KIND_COUNT]; /* index of the case */
    double margin;
    int margin_case; /* -1 when there is none */
} utw_stress_envelope;

/** [in] peaks[n], n >= 1, borrowed. UTW_E_ARGUMENT. */
UTW_API UTW_CHECK utw_status utw_stress_envelope_of(int n, const utw_stress_peaks *peaks,
                                                    utw_stress_envelope *envelope, utw_error *err);

/** The number of sharp re-entrant corners. */
UTW_API int utw_stress_corner_count(const utw_stress *stress);

/** The k-th one: its place at[2] [L], and the radius [L] of the circle around it outside of which stresses are
 *  reported: a tenth of the thinner wall at the corner. UTW_E_ARGUMENT. */
UTW_API UTW_CHECK utw_status utw_stress_corner(const utw_stress *stress, int k, double at[2], double *radius,
                                               utw_error *err);

/** The load cases of an outline with their greatest stresses, and the stresses at chosen points. */
typedef struct utw_cases utw_cases;

/** Compute them. [in] stress, borrowed; it must outlive the cases. name[n_name], borrowed: the cases wanted, by their
 *  names in the section file; n_name = 0: all. probe[n_probe][2], borrowed: points [L]. A case that the section cannot
 *  carry, or that needs a Poisson's ratio which is missing, is kept with its reason: utw_cases_get() gives it.
 *  [out] *cases, returned owned: utw_cases_free(). UTW_E_ARGUMENT; UTW_E_LOAD when there is no case of a name or a
 *  point lies outside; UTW_E_NOMEM. */
UTW_API UTW_CHECK utw_status utw_cases_create(const utw_stress *stress, int n_name, const char *const *name,
                                              int n_probe, const double (*probe)[2], utw_cases **cases,
                                              utw_error *err);

/** Free them; NULL is allowed. */
UTW_API void utw_cases_free(utw_cases *cases);

/** Their number, in the order of the section file. */
UTW_API int utw_cases_count(const utw_cases *cases);

/** The k-th case. [out] *name, returned borrowed, and *forces, also when the case has no result; *peaks. Each may be
 *  NULL. UTW_E_ARGUMENT; the case's own UTW_E_MATERIAL or UTW_E_LOAD. */
UTW_API UTW_CHECK utw_status utw_cases_get(const utw_cases *cases, int k, const char **name, utw_forces *forces,
                                           utw_stress_peaks *peaks, utw_error *err);

/** The stress of the k-th case at a probe. Statuses as of utw_cases_get(). */
UTW_API UTW_CHECK utw_status utw_cases_probe(const utw_cases *cases, int k, int probe, utw_stress_point *point,
                                             utw_error *err);

/** The envelope of the cases that have results; its indices are those of utw_cases_get(). UTW_E_ARGUMENT;
 *  UTW_E_LOAD when none has. */
UTW_API UTW_CHECK utw_status utw_cases_envelope(const utw_cases *cases, utw_stress_envelope *envelope,
                                                utw_error *err);

/* ---- the push ------------------------------------------------------------------------------------ */

/** What holds the bar, from z = 0 to z = length. A fixed end holds deflection, rotation and twist; a fork holds
 *  deflection and twist and lets the section rotate. */
typedef enum utw_support {
    UTW_FIXED_FREE = 0, /* a cantilever */
    UTW_FIXED_FIXED,
    UTW_FORKED, /* a fork at each end */
    UTW_FIXED_FORKED,
    UTW_SUPPORT_COUNT
} utw_support;

/** Whether the supports hold the warping of the section. Free ends never do. */
typedef enum utw_hold_warping {
    UTW_WARPING_USUAL = 0, /* fixed ends hold it, forks do not */
    UTW_WARPING_FREE,      /* nowhere */
    UTW_WARPING_HELD       /* at every support, and whatever the section: see `uniform_torsion` below */
} utw_hold_warping;

/** Where along the bar the force acts. */
typedef enum utw_along_bar {
    UTW_WHERE_USUAL = 0, /* at the tip of a cantilever, else in the middle */
    UTW_AT_TIP,          /* z = length */
    UTW_AT_MID,          /* z = length/2 */
    UTW_AT_Z,            /* at the given z */
    UTW_UNIFORM          /* spread evenly over the length; `force` is its sum */
} utw_along_bar;

/** A bar and the transverse load on it. Start from UTW_PUSH_INIT and set at least `length`. */
typedef struct utw_push_load {
    int version;     /* 1 */
    double length;   /* [L] > 0 */
    double force[2]; /* Fx, Fy [F]; not both zero. UTW_PUSH_INIT: one unit of force downward */
    int has_at;      /* 0: at the shear centre; 1: at the place below */
    double at[2];    /* in the drawing's coordinates; it need not lie in the section: a bracket will do [L] */
    utw_support support;
    utw_hold_warping warping;
    utw_along_bar where;
    double z;            /* with UTW_AT_Z [L] */
    double twist_limit;  /* greatest twist allowed [rad]; 0: none is set */
    double stress_limit; /* greatest von Mises stress allowed [F/L^2]; 0: the least yield stress of the parts, when
                            each has one */
} utw_push_load;

#define UTW_PUSH_INIT                                                                                                  \
    {1, 0.0, {0.0, -1.0}, 0, {0.0, 0.0}, UTW_FIXED_FREE, UTW_WARPING_USUAL, UTW_WHERE_USUAL, 0.0, 0.0, 0.0}

/** The bar at a station. */
typedef struct utw_push_state {
    double z;
    double u[2];           /* deflection of the shear centre [L] */
    double slope[2];       /* du/dz, with the shear strain [1] */
    double twist, twist1;  /* turns x toward y [rad]; by z [rad/L] */
    utw_forces forces;     /* resultants, for utw_stress_at(): T is the part of the torque in uniform torsion */
    double torque;         /* all of it [F L] */
    double warping_torque; /* the rest: -dB/dz [F L]. Its shear stress is not in the stresses */
} utw_push_state;

/** Between which places the load may act for something to stay within its limit. Places are told by their offset from
 *  the shear centre along `across`; along the line of the force the place does not matter. */
typedef struct utw_load_window {
    int limited;            /* 0: no limit was set, and the rest is zero */
    double limit;           /* [rad] or [F/L^2] */
    int empty;              /* 1: there is no such place, and from, to are NAN */
    double from, to, error; /* offsets, from <= to, and about how far each may be off [L] */
    double at_from[2], at_to[2]; /* these places on the line through the shear centre [L] */
    int holds;              /* 1: the load, where it acts, is within */
} utw_load_window;

/** What the push does. */
typedef struct utw_push_result {
    double E, G;               /* [F/L^2] */
    double z;                  /* where the force acts; NAN when it is spread [L] */
    int warping_held[2];       /* at z = 0 and z = length */
    double fade;               /* sqrt(E Iw / (G J)): the effect of held warping falls to 1/e over this [L] */
    int uniform_torsion;       /* 1: it fades within a fifth of the section's size, where no theory of bars holds: most
                                  solid sections and closed tubes. Saint-Venant's torsion is taken all along and there
                                  is no bimoment, unless UTW_WARPING_HELD asks for it */
    double size;               /* diagonal of the section's box [L] */
    double shear_centre[2];    /* a load through it does not twist the bar [L] */
    double shear_centre_error; /* half the width of its bracket along `across` [L] */
    double across[2];          /* unit vector at right angles to the force, along which offsets are measured: of the two
                                  the one that points more to the right; for a horizontal force up */
    double section[2];         /* between these offsets the section lies [L] */
    double offset;             /* of the load [L] */
    utw_quantity twist_per_offset; /* greatest twist along the bar over the offset of the load [rad/L]. Twist is
                                      linear in the place: this is the whole line; it is zero at the shear centre */
    double z_twist;             /* where along the bar it is greatest [L] */
    utw_quantity twist;         /* greatest twist, with its sign [rad] */
    utw_quantity deflection[2]; /* of the shear centre along x and y, where it is greatest [L] */
    double z_deflection;
    double load_moves[2];      /* displacement of the place the load acts at, twist included; of a spread load where
                                  the deflection is greatest [L] */
    utw_push_state start, end; /* at z = 0 and z = length: with the resultants on the sections of the supports */
    int has_stress;            /* 0: no stresses were given, and the rest but twist_window is zero */
    utw_stress_peak von_mises; /* greatest anywhere in the bar */
    double z_von_mises;
    int unbounded; /* 1: outside the circles around sharp re-entrant corners only, as in utw_stress_peaks */
    double margin; /* least yield stress over it, minus 1; NAN without one */
    utw_load_window twist_window, stress_window;
    utw_load_window window; /* what both leave; its `limit` is zero */
} utw_push_result;

/** A bar under a transverse load. */
typedef struct utw_push utw_push;

/** Compute it. [in] solution and stress (of this solution; NULL: no stresses, no stress window) are borrowed and must
 *  outlive the push; load, borrowed. [out] *push, returned owned: utw_push_free().
 *  Bending about both principal axes with shear, and restrained torsion E Iw theta'''' - G J theta'' = m, in closed
 *  form; they do not couple when forces are taken to the shear centre (Trefftz 1935). Methods: docs/push.md.
 *  UTW_E_ARGUMENT; UTW_E_MATERIAL when the parts have not one E and nu; UTW_E_LOAD: a length, force, place or limit
 *  that is impossible, a load on a support; UTW_E_NOMEM. */
UTW_API UTW_CHECK utw_status utw_push_create(const utw_solution *solution, const utw_stress *stress,
                                             const utw_push_load *load, utw_push **push, utw_error *err);

/** Free it; NULL is allowed. */
UTW_API void utw_push_free(utw_push *push);

/** The result, returned borrowed. */
UTW_API const utw_push_result *utw_push_get(const utw_push *push);

/** The load it was made with, returned borrowed. */
UTW_API const utw_push_load *utw_push_get_load(const utw_push *push);

/** The bar at 0 <= z <= length (clamped). At the force itself what jumps is as on its left. [out] *state. */
UTW_API void utw_push_at(const utw_push *push, double z, utw_push_state *state);

/** Greatest twist along the bar when the same load acts at another place [rad]. [in] at[2], drawing's coordinates. */
UTW_API double utw_push_twist_of(const utw_push *push, const double at[2]);

/** Greatest von Mises stress anywhere in the bar when the same load acts at another place. [out] *peak; *z, may be
 *  NULL. UTW_E_ARGUMENT, also when the push was made without stresses; UTW_E_NOMEM. */
UTW_API UTW_CHECK utw_status utw_push_stress_of(const utw_push *push, const double at[2], utw_stress_peak *peak,
                                                double *z, utw_error *err);

/* ---- thin-walled theory -------------------------------------------------------------------------- */

/** What the thin-walled theory says of a midline: area on the midline, no thickness terms in the second
 *  moments and in Iw. Second moments are about the centroid in the directions of the drawing's axes.
 *  Sources: docs/theory-thinwall.md (Vlasov 1961; Bredt 1896; Batho 1916). */
typedef struct utw_thin_constants {
    double A, length;          /* [L^2], length of all walls [L] */
    double xc, yc;             /* centroid [L] */
    double Ixx, Iyy, Ixy;      /* int y^2, x^2, x y dA [L^4] */
    double I1, I2, angle;      /* principal ones; from x to the axis of I1, in (-pi/2, pi/2] [rad] */
    double J, J_bredt, J_open; /* J = flows around the cells + sum int t^3/3 ds [L^4] */
    double Wt;                 /* J / greatest (|q|/t + t), q per G theta': torque / shear at a face [L^3] */
    double xs, ys;             /* shear centre [L] */
    double Iw;                 /* warping constant about the shear centre [L^6] */
    double Iw_secondary;       /* int t^3/12 r_t^2 ds: warping across the walls, not part of Iw [L^6] */
    double Asx, Asy;           /* shear areas V^2 / int q^2/t ds, load through the shear centre [L^2] */
    double shear_xy;           /* int qx qy/t ds of unit Vx and unit Vy: what couples them [1/L^2] */
    int n_cells;               /* independent cells */
    int n_junctions, n_ends;   /* nodes with three or more walls; nodes with one */
    int straight;              /* 1: all walls lie on one line. A force across it has no flow: its shear area
                                  is 0 (both are when the line is slanted); the shear centre is the mean of
                                  the line weighted with t^3 */
} utw_thin_constants;

/** An analysed midline. */
typedef struct utw_thin utw_thin;

/** Analyse a midline. [in] midline, borrowed. [out] *thin, returned owned: utw_thin_free().
 *  UTW_E_ARGUMENT (NULL, counts), UTW_E_OUTLINE (a wall without length or thickness, an arc that is none,
 *  walls on one another or crossing without a node, a node on a wall it is not joined to, more than one
 *  piece; err->vertex is the index of the wall or node), UTW_E_NOMEM, UTW_E_SINGULAR. Messages count walls
 *  from 1 and give nodes by index, the number that from and to hold. */
UTW_API UTW_CHECK utw_status utw_thin_solve(const utw_midline *midline, utw_thin **thin, utw_error *err);

/** Free it; NULL is allowed. */
UTW_API void utw_thin_free(utw_thin *thin);

/** Its constants. Returned borrowed. */
UTW_API const utw_thin_constants *utw_thin_get(const utw_thin *thin);

/** What acts on the section. Shear forces act through the shear centre, N at the centroid. */
typedef struct utw_thin_load {
    double N, Vx, Vy; /* [F] */
    double Mx, My;    /* about the centroid [F L] */
    double T;         /* Saint-Venant torque G J theta' [F L] */
    double Tw;        /* warping torque -E Iw theta''' = -dB/dz [F L] */
    double B;         /* bimoment int sigma omega dA = E Iw theta'' [F L^2] */
} utw_thin_load;

/** What is found at a station of a wall. Shear is positive in the direction from `from` to `to`; left and
 *  right are as seen looking that way, with x to the right and y up. */
typedef struct utw_thin_station {
    double x, y;       /* [L] */
    double tangent[2]; /* unit vector from `from` to `to` [1] */
    double t;          /* thickness [L] */
    double omega;      /* sectorial coordinate about the shear centre, mean 0; u_z = theta' omega [L^2] */
    double q;          /* shear flow of Vx, Vy, of T around the cells, and of Tw [F/L] */
    double sigma;      /* normal stress of N, Mx, My, B [F/L^2] */
    double tau;        /* q/t, shear stress on the midline [F/L^2] */
    double tau_left;   /* tau - T t/J, on the left face [F/L^2] */
    double tau_right;  /* tau + T t/J, on the right face [F/L^2] */
} utw_thin_station;

/** Flow and stresses at fraction u (0 .. 1) of a wall's length. [in] load, borrowed.
 *  UTW_E_ARGUMENT when wall or u is out of range; UTW_E_LOAD when the midline cannot carry the load: a force
 *  or moment across a straight line of walls, a bimoment or warping torque where Iw = 0, a number that is
 *  not finite. */
UTW_API UTW_CHECK utw_status utw_thin_at(const utw_thin *thin, int wall, double u,
                                         const utw_thin_load *load, utw_thin_station *station,
                                         utw_error *err);

/* ---- the midline of an outline ------------------------------------------------------------------- */

/** What a wall of a found midline is. */
typedef enum utw_wall_kind {
    UTW_WALL_PLATE = 0, /* a wall with two faces */
    UTW_WALL_BEND = 1,  /* the rounding of a corner between two walls: an arc that touches both, its mean radius at
                           most 5.5 thicknesses */
    UTW_WALL_LUMP = 2,  /* a thick part, such as a bulb, as a wall of its own width with its area */
    UTW_WALL_LINK = 3   /* joins midlines that lie side by side where walls meet */
} utw_wall_kind;

/** A wall of an idealisation, beside what utw_midline says of it. */
typedef struct utw_wall_info {
    utw_wall_kind kind;
    double length;      /* from node to node [L] */
    double thickness;   /* mean [L] */
    double plate_length; /* of the plate it is part of [L] */
    double slenderness; /* length over thickness of the plate it is part of: pieces that go on smoothly with about
                           the same thickness are one [1] */
    int slender;        /* 1: slenderness of at least 3, the least to be thought of as a wall */
} utw_wall_info;

/** The figures of an idealisation. */
typedef struct utw_idealisation_info {
    int given;                /* 1: the midline the section was drawn by; 0: found in the outline */
    int walls, bends, links;  /* plates and lumps; bends; links */
    int lumps;                /* of the walls */
    int junctions;            /* nodes where three or more walls meet */
    int cells, holes;         /* of the midline; of the outline */
    double length, thickness; /* of all walls [L]; mean: area over length [L] */
    double area_share;        /* of the area in corners, junctions and fillets: not between two faces of a wall */
    double slender_share;     /* of the area in slender walls */
    double slenderness;       /* greatest of all walls */
    double area_error;        /* area of the midline over that of the section, less 1. Corners cancel, a tee is
                                 counted twice for half a wall, fillets are missing */
    double length_error;      /* length of the walls and half the width of free ends over half the perimeter, less 1 */
} utw_idealisation_info;

/** The thin-walled idealisation of a section. */
typedef struct utw_idealisation utw_idealisation;

/** Find the midline of a section, or take the one it was drawn by. [in] outline, borrowed. [out] *idealisation, returned
 *  owned: utw_idealisation_free().
 *  UTW_E_NO_THIN_WALL when the section has no thin-walled sense: the message is a sentence with the figures.
 *  UTW_E_OUTLINE, UTW_E_MESH, UTW_E_NOMEM.
 *  Method: docs/compare.md; chordal axis of the constrained Delaunay triangulation (Prasad 1997). */
UTW_API UTW_CHECK utw_status utw_idealise(const utw_outline *outline, utw_idealisation **idealisation,
                                          utw_error *err);

/** The same with a midline of one's own in place of one found. [in] midline, copied. UTW_E_ARGUMENT, UTW_E_NO_THIN_WALL,
 *  UTW_E_NOMEM, and UTW_E_OUTLINE as utw_thin_solve(). */
UTW_API UTW_CHECK utw_status utw_idealise_as(const utw_outline *outline, const utw_midline *midline,
                                             utw_idealisation **idealisation, utw_error *err);

/** Free it; NULL is allowed. */
UTW_API void utw_idealisation_free(utw_idealisation *idealisation);

/** Its midline, in the drawing's coordinates. Returned borrowed. */
UTW_API const utw_midline *utw_idealisation_midline(const utw_idealisation *idealisation);

/** What its thin-walled theory says. Returned borrowed. */
UTW_API const utw_thin *utw_idealisation_thin(const utw_idealisation *idealisation);

/** Wall `wall` of the midline; NULL when out of range. Returned borrowed. */
UTW_API const utw_wall_info *utw_idealisation_wall(const utw_idealisation *idealisation, int wall);

/** Its figures. Returned borrowed. */
UTW_API const utw_idealisation_info *utw_idealisation_get(const utw_idealisation *idealisation);

/** Why a found midline is not to be trusted: a sentence with figures; "" when there is no reason. It has as many cells as
 *  the section has holes, its area is that of the section within 10 % and its length that of the boundary within 25 %,
 *  or the sentence says so. Returned borrowed. */
UTW_API const char *utw_idealisation_doubt(const utw_idealisation *idealisation);

/* ---- the comparison of both ----------------------------------------------------------------------- */

/** What a difference is in parts of. */
typedef enum utw_difference_base {
    UTW_OF_SOLID = 0, /* the solid value itself */
    UTW_OF_WIDTH,     /* xc, xs: the width of the section */
    UTW_OF_DEPTH,     /* yc, ys: its depth */
    UTW_OF_MEAN       /* Ixy: sqrt(Ixx Iyy) */
} utw_difference_base;

/** A constant by both theories, in the units of utw_solution_constant(). */
typedef struct utw_compared {
    utw_constant which;
    const char *absent; /* NULL; else a sentence why there is nothing to compare, and the rest is not set. Borrowed */
    utw_quantity solid;
    double thin;
    utw_difference_base base;
    double difference; /* (thin - solid) over its base [1] */
    int within;        /* 1: at most the limit, for every solid value between its bounds */
} utw_compared;

/** A solid solution and a thin-walled idealisation of the same section, side by side. */
typedef struct utw_comparison utw_comparison;

/** Compare. [in] solution, idealisation, borrowed; they must outlive the comparison. limit: the greatest difference
 *  at which the thin-walled value may stand for the solid one, such as 0.05; 1e-6 .. 1. [out] *comparison, returned
 *  owned: utw_comparison_free(). Compared are A, xc, yc, Ixx, Iyy, Ixy, I1, I2, J, Wt, xs, ys, Iw, Asx, Asy; where the
 *  thin-walled Iw is 0, Iw_secondary stands for it. UTW_E_ARGUMENT, UTW_E_NOMEM; UTW_E_MATERIAL for parts of
 *  different materials. */
UTW_API UTW_CHECK utw_status utw_compare(const utw_solution *solution, const utw_idealisation *idealisation,
                                         double limit, utw_comparison **comparison, utw_error *err);

/** Free it; NULL is allowed. */
UTW_API void utw_comparison_free(utw_comparison *comparison);

/** How many constants are compared, and the k-th one; NULL when k is out of range. Returned borrowed. */
UTW_API int utw_comparison_count(const utw_comparison *comparison);
UTW_API const utw_compared *utw_comparison_get(const utw_comparison *comparison, int k);

/** The limit. */
UTW_API double utw_comparison_limit(const utw_comparison *comparison);

/** For which constants the idealisation may be used and for which not, in a sentence or two. Returned borrowed. */
UTW_API const char *utw_comparison_verdict(const utw_comparison *comparison);

/** The reasons found, a sentence each; NULL when k is out of range. Returned borrowed. */
UTW_API int utw_comparison_reason_count(const utw_comparison *comparison);
UTW_API const char *utw_comparison_reason(const utw_comparison *comparison, int k);

/** Its idealisation. Returned borrowed. */
UTW_API const utw_idealisation *utw_comparison_idealisation(const utw_comparison *comparison);

/* ---- the thickness study -------------------------------------------------------------------------- */

/** Factors on the thickness of all walls: `steps` equal steps. */
typedef struct utw_study_range {
    double from, to; /* 1e-3 .. 1e3 [1] */
    int steps;       /* 2 .. 500 */
} utw_study_range;

/** One step. */
typedef struct utw_study_step {
    double factor;
    double thickness;   /* mean of all walls [L] */
    double ratio;       /* over the length of the longest plate [1] */
    const char *failed; /* NULL; else why the midline cannot have this thickness. Borrowed */
} utw_study_step;

/** Both theories as the walls of a midline grow thicker. */
typedef struct utw_study utw_study;

/** Give the walls of the idealisation's midline the factors times their thickness, thicken it (mitred corners, no
 *  fillets), and compare both theories at each step. [in] outline: whose units and material are used; idealisation;
 *  options, of the solid solutions, NULL for the defaults; range; limit as of utw_compare(); all borrowed.
 *  [out] *study, returned owned: utw_study_free(). Calls the mesher. A step at which the walls do not fit says so.
 *  UTW_E_ARGUMENT, UTW_E_NOMEM; UTW_E_NO_THIN_WALL when no step can be thickened. */
UTW_API UTW_CHECK utw_status utw_thickness_study(const utw_outline *outline, const utw_idealisation *idealisation,
                                                 const utw_options *options, const utw_study_range *range,
                                                 double limit, utw_study **study, utw_error *err);

/** Free it; NULL is allowed. */
UTW_API void utw_study_free(utw_study *study);

/** How many steps, one of them (NULL when out of range), the limit. Returned borrowed. */
UTW_API int utw_study_count(const utw_study *study);
UTW_API const utw_study_step *utw_study_get(const utw_study *study, int step);
UTW_API double utw_study_limit(const utw_study *study);

/** The difference of a constant at a step, as utw_compared.difference. [out] *difference, untouched when there is none;
 *  then 0 is returned, else 1. */
UTW_API int utw_study_difference(const utw_study *study, int step, utw_constant which, double *difference);

/** Where a constant crosses the limit, such as "J: within 5 % up to t = 6.3 mm (t/b = 0.11)"; linear between steps. NULL
 *  when it was never compared. Returned borrowed. */
UTW_API const char *utw_study_statement(const utw_study *study, utw_constant which);

/* ---- reports ------------------------------------------------------------------------------------- */

/** What a report tells. Start from UTW_REPORT_INIT; what stays NULL is left out. */
typedef struct utw_report {
    int version;                  /* 1 */
    const utw_solution *solution; /* borrowed; required */
    const utw_cases *cases;       /* borrowed: load cases and probes of this solution */
    const utw_comparison *comparison; /* borrowed: of this solution; in the JSON and in utw_report_comparison() */
    const utw_study *study;           /* borrowed: beside a comparison */
    const utw_push *push;         /* borrowed: a push of this solution */
} utw_report;

#define UTW_REPORT_INIT {1, NULL, NULL, NULL, NULL, NULL}

/** A table for people: the constants with their bounds, trust and units, what is left out and why, what
 *  the solution took. Plain text of at most 100 columns at usual tolerances. Angles are in degrees.
 *  [out] *text, returned owned: utw_report_free(). UTW_E_ARGUMENT, UTW_E_NOMEM. */
UTW_API UTW_CHECK utw_status utw_report_text(const utw_report *report, char **text, utw_error *err);

/** The same for programs: JSON as docs/results.md says. Numbers read back as the very doubles of the
 *  library, angles in degrees; a number that does not exist is null. [out] *text, returned owned:
 *  utw_report_free(). UTW_E_ARGUMENT, UTW_E_NOMEM. */
UTW_API UTW_CHECK utw_status utw_report_json(const utw_report *report, char **text, utw_error *err);

/** The load cases and probes of the report as comma-separated values (RFC 4180): one line for each number, with the
 *  columns case, point, quantity, value, error, x, y, unit. [out] *text, returned owned: utw_report_free().
 *  UTW_E_ARGUMENT (report->cases is needed), UTW_E_NOMEM. */
UTW_API UTW_CHECK utw_status utw_report_csv(const utw_report *report, char **text, utw_error *err);

/** The comparison for people: the verdict, the table of both values, the reasons, the walls. Plain text of at most 100
 *  columns at usual tolerances. [out] *text, returned owned: utw_report_free(). UTW_E_ARGUMENT (report->comparison is
 *  needed), UTW_E_NOMEM. */
UTW_API UTW_CHECK utw_status utw_report_comparison(const utw_report *report, char **text, utw_error *err);

/** A midline as a section file (docs/section-file.md), to be edited and read again. [in] midline, name, units, borrowed.
 *  [out] *text, returned owned: utw_report_free(). UTW_E_ARGUMENT, UTW_E_NOMEM. */
UTW_API UTW_CHECK utw_status utw_midline_file(const utw_midline *midline, const char *name, const char *units,
                                              char **text, utw_error *err);

/** The solution for general-purpose viewers: a VTK XML unstructured grid (.vtu) of Lagrange triangles of the elements'
 *  orders on the curved section, values as appended binary. Point data: omega about the shear centre [L^2], phi [L^2],
 *  the shear stress vectors of unit forces, and of each load case with a result sigma_z, the vector tau, von_mises.
 *  Neighbouring elements do not share points: stresses may jump there. [in] path, borrowed; an existing file is
 *  replaced. UTW_E_ARGUMENT, UTW_E_FILE, UTW_E_NOMEM. */
UTW_API UTW_CHECK utw_status utw_report_vtu(const utw_report *report, const char *path, utw_error *err);

/** The push of the report for people: deflection, twist, the sections at the ends, the worst stress, the load window,
 *  with notes. Text as of utw_report_text(). UTW_E_ARGUMENT (report->push is needed), UTW_E_NOMEM. */
UTW_API UTW_CHECK utw_status utw_report_push(const utw_report *report, char **text, utw_error *err);

/** Free a report; NULL is allowed. */
UTW_API void utw_report_free(char *text);

/* ---- pictures ------------------------------------------------------------------------------------ */

/** Kinds of pictures. */
typedef enum utw_picture {
    UTW_PICTURE_OUTLINE = 0, /* outline, extent, centroid, shear centre, centre of flexure, principal axes */
    UTW_PICTURE_MESH,        /* elements, their orders, the layers in the corners */
    UTW_PICTURE_WARPING,     /* warping function about the shear centre, as contours */
    UTW_PICTURE_WARPED,      /* tilted view of the warped end of the bar */
    UTW_PICTURE_STRESS,      /* a stress of a load case as contours, shear with arrows */
    UTW_PICTURE_COUNT
} utw_picture;

/** Key of a kind, such as "warping". Returned borrowed; NULL when out of range. */
UTW_API const char *utw_picture_key(utw_picture which);

/** What it shows, in a few words. Returned borrowed; NULL when out of range. */
UTW_API const char *utw_picture_meaning(utw_picture which);

/** Stresses that a picture may show. */
typedef enum utw_stress_component {
    UTW_SHOW_VON_MISES = 0,
    UTW_SHOW_SIGMA_Z,
    UTW_SHOW_TAU, /* sqrt(tau_xz^2 + tau_yz^2), with arrows for its direction */
    UTW_SHOW_TAU_XZ,
    UTW_SHOW_TAU_YZ,
    UTW_STRESS_COMPONENT_COUNT
} utw_stress_component;

/** Key of a component, such as "sigma_z". Returned borrowed; NULL when out of range. */
UTW_API const char *utw_stress_component_key(utw_stress_component which);

/** How to draw. Start from UTW_DRAW_OPTIONS_INIT. */
typedef struct utw_draw_options {
    int version;  /* 1 */
    double width; /* of the page, 40 .. 1200 [mm]; its height follows */
    double dpi;   /* dots per inch of a PNG, 20 .. 2400 */
    const char *load_case; /* of the section file, for stresses; borrowed; NULL: the first */
    utw_stress_component component;
} utw_draw_options;

#define UTW_DRAW_OPTIONS_INIT {1, 160.0, 150.0, NULL, UTW_SHOW_VON_MISES}

/** Draw and write as the ending of the path asks: .svg, .pdf, .png. [in] solution, options (NULL: the defaults),
 *  path, borrowed. An existing file is replaced. UTW_E_ARGUMENT; UTW_E_FILE when the path cannot be written;
 *  UTW_E_NOMEM; for stresses UTW_E_LOAD when there is no such load case or the section cannot carry it, and
 *  UTW_E_MATERIAL as of utw_stress_create() and utw_stress_at(). */
UTW_API UTW_CHECK utw_status utw_draw(const utw_solution *solution, utw_picture what,
                                      const utw_draw_options *options, const char *path, utw_error *err);

typedef enum utw_picture_format { UTW_SVG = 0, UTW_PDF, UTW_PNG } utw_picture_format;

/** The same as a file in memory: [out] *bytes [*n], returned owned: utw_draw_free(). */
UTW_API UTW_CHECK utw_status utw_draw_bytes(const utw_solution *solution, utw_picture what,
                                            const utw_draw_options *options, utw_picture_format format,
                                            unsigned char **bytes, size_t *n, utw_error *err);

/** Free them; NULL is allowed. */
UTW_API void utw_draw_free(unsigned char *bytes);

#ifdef __cplusplus
}
#endif
#endif
