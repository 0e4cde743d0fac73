/* SPDX-License-Identifier: GPL-3.0-or-later
 * Every file of this folder is refused with its own status, place and message. */
#include <dirent.h>
#include <unistd.h>

#include "support/support.h"

static const struct {
    const char *name; /* of the file, without .json */
    utw_status status;
    int part, loop, vertex;
    const char *message; /* without the name of the file */
} row[] = {
    {"aerofoil_edge_of_points", UTW_E_SYNTAX, -1, -1, -1,
     "aerofoil: \"edge\" is for \"naca\"; the edge of a list of points is as listed"},
    {"aerofoil_edge_unknown", UTW_E_SYNTAX, -1, -1, -1, "\"edge\" must be \"sharp\" or \"blunt\""},
    {"aerofoil_naca_a_number", UTW_E_SYNTAX, -1, -1, -1,
     "\"naca\" must be a text in double quotes, not a number"},
    {"aerofoil_naca_and_points", UTW_E_SYNTAX, -1, -1, -1,
     "aerofoil: \"naca\" and \"points\" are both given; keep one"},
    {"aerofoil_naca_five_digits", UTW_E_SYNTAX, -1, -1, -1,
     "\"23012\" is no NACA four-digit designation; it must be four digits, such as \"2412\""},
    {"aerofoil_nose_unknown", UTW_E_SYNTAX, -1, -1, -1,
     "\"nose\" must be \"solid\" or a part of the chord, not true or false"},
    {"aerofoil_points_bad", UTW_E_SYNTAX, -1, -1, -1,
     "aerofoil_points_bad.dat: line 4 is not two numbers: \"0.2\""},
    {"aerofoil_points_missing", UTW_E_FILE, -1, -1, -1,
     "no-such-list.dat: cannot be opened: No such file or directory"},
    {"aerofoil_r_negative", UTW_E_OUTLINE, -1, -1, -1, "aerofoil: r = -0.5 must be 0 or more"},
    {"aerofoil_r_too_large", UTW_E_OUTLINE, -1, -1, -1,
     "aerofoil: r = 40 does not fit in the corner at (88, 21.58), before the section is placed; "
     "the greatest that fits in this bay is 15.73"},
    {"aerofoil_skin_empty", UTW_E_SYNTAX, -1, -1, -1,
     "\"skin\" is empty; give a thickness, or [[part of chord, thickness], ...]"},
    {"aerofoil_skin_station", UTW_E_SYNTAX, -1, -1, -1,
     "a station of \"skin\" must be [part of chord, thickness], not a number"},
    {"aerofoil_skin_too_thick", UTW_E_OUTLINE, -1, -1, -1,
     "aerofoil: the skin fills the section, which is 36.02 thick at most, at 0.3 of the chord; "
     "make it thinner, or \"solid\""},
    {"aerofoil_spar_cap_zero", UTW_E_OUTLINE, -1, -1, -1,
     "\"cap\" is [0, 2]; both must be greater than 0"},
    {"aerofoil_spar_without_t", UTW_E_SYNTAX, -1, -1, -1, "aerofoil, spar 1: \"t\" is missing"},
    {"aerofoil_spars_out_of_order", UTW_E_OUTLINE, -1, -1, -1,
     "aerofoil, spar 2: \"at\" is 0.2; list the spars from the nose to the tail"},
    {"aerofoil_unknown_key", UTW_E_SYNTAX, -1, -1, -1,
     "unknown key \"ribs\"; known here: naca, points, chord, skin, spars, nose, tail, edge, r"},
    {"aerofoil_without_chord", UTW_E_SYNTAX, -1, -1, -1,
     "aerofoil: \"chord\" is missing; give its length"},
    {"aerofoil_without_points", UTW_E_SYNTAX, -1, -1, -1,
     "aerofoil: \"naca\" or \"points\" is missing; give one of them"},
    {"aerofoil_without_skin", UTW_E_SYNTAX, -1, -1, -1,
     "aerofoil: \"skin\" is missing; give its thickness"},
    {"arc_in_line", UTW_E_OUTLINE, 0, 0, 2,
     "part 1, outline, vertex 3: there is no arc from (40, 0) through (40, 12) to (40, 30): the "
     "three points lie in line or coincide; move the point of \"arc\", or leave it out for a "
     "straight edge"},
    {"arc_of_two_points", UTW_E_SYNTAX, 0, 0, 2,
     "part 1, outline, vertex 3: x of \"arc\" must be a number, not an array"},
    {"bezier_one_point", UTW_E_SYNTAX, 0, 0, 2,
     "part 1, outline, vertex 3: \"bezier\" must be two control points [[x, y], [x, y]]; it has 1"},
    {"bulge_absurd", UTW_E_OUTLINE, 0, 0, 2,
     "part 1, outline, vertex 3: a \"bulge\" of 100 turns through 357.7 degrees, nearly a whole "
     "circle; \"bulge\" is the tangent of a quarter of the arc's angle: 1 for a semicircle"},
    {"bulge_zero", UTW_E_OUTLINE, 0, 0, 2,
     "part 1, outline, vertex 3: a \"bulge\" of 0 is a straight edge; leave it out"},
    {"chamfer_does_not_fit", UTW_E_OUTLINE, 0, 0, 2,
     "part 1, outline, vertex 3: \"chamfer\": 30.5 does not fit between its two edges; the "
     "greatest that fits is 30"},
    {"chamfer_negative", UTW_E_OUTLINE, 0, 0, 2,
     "part 1, outline, vertex 3: \"chamfer\" is -2; it must be greater than 0, or left out"},
    {"circle_and_ellipse", UTW_E_SYNTAX, 0, 0, -1,
     "part 1, outline: a loop is a circle or an ellipse, not both; remove one"},
    {"circle_radius_negative", UTW_E_OUTLINE, 0, 0, -1,
     "part 1, outline: the radius of the circle is -5; it must be greater than 0"},
    {"circle_two_numbers", UTW_E_SYNTAX, 0, 0, -1,
     "part 1, outline: \"circle\" must be [xc, yc, r]; it has 2 members"},
    {"closing_vertex", UTW_E_OUTLINE, 0, 0, 4,
     "part 1, outline, vertex 5: the last vertex repeats the first; the loop closes by itself: "
     "remove the last vertex"},
    {"closing_vertex_with_arc", UTW_E_OUTLINE, 0, 0, 3,
     "part 1, outline, vertex 4: the last vertex repeats the first; the loop closes by itself: "
     "move the curve to vertex 1 and remove the last vertex"},
    {"comma_before_bracket", UTW_E_SYNTAX, -1, -1, -1,
     "line 2, column 45: a comma stands before the closing ]; remove it"},
    {"comment", UTW_E_SYNTAX, -1, -1, -1, "line 1, column 19: comments are not allowed"},
    {"cut_off", UTW_E_SYNTAX, -1, -1, -1,
     "line 2, column 38: the text ends before its brackets are closed; ] is missing"},
    {"decimal_comma", UTW_E_SYNTAX, -1, -1, -1, "line 2, column 44: expected a comma or ], not ;"},
    {"deep", UTW_E_SYNTAX, -1, -1, -1,
     "line 1, column 33: brackets stand more than 32 deep inside one another"},
    {"dimension_makes_no_outline", UTW_E_OUTLINE, 0, 0, 1,
     "part 1, outline, vertex 2: (0, 0) is the same point as vertex 1; remove one of them"},
    {"ellipse_axis_zero", UTW_E_OUTLINE, 0, 0, -1,
     "part 1, outline: the semi-axes of the ellipse are 5 and 0; both must be greater than 0"},
    {"empty", UTW_E_SYNTAX, -1, -1, -1, "the file is empty; a section file starts with {"},
    {"expression_cut_off", UTW_E_SYNTAX, 0, 0, 2,
     "part 1, outline, vertex 3: \"round\": \"b/\" ends too early; complete the expression"},
    {"expression_decimal_comma", UTW_E_SYNTAX, 0, 0, 3,
     "part 1, outline, vertex 4: y of the vertex: \"29,5\" has 2 values; a decimal comma must be a "
     "point"},
    {"expression_empty", UTW_E_SYNTAX, 0, 0, 3,
     "part 1, outline, vertex 4: x of the vertex: the expression is empty"},
    {"expression_unknown_name", UTW_E_SYNTAX, 0, 0, 2,
     "part 1, outline, vertex 3: y of the vertex: \"h-3\" has the unknown name \"h\"; define it in "
     "\"let\""},
    {"expression_with_unit", UTW_E_SYNTAX, 0, 0, 1,
     "part 1, outline, vertex 2: x of the vertex: \"40 mm\" is not understood from its character 4 "
     "on: \"mm\""},
    {"hole_circle_radius_zero", UTW_E_OUTLINE, 0, 2, -1,
     "part 1, hole 2: the radius of the circle is 0; it must be greater than 0"},
    {"hole_outside", UTW_E_OUTLINE, 0, 1, -1,
     "part 1, hole 1: it lies outside the outline of its part, near (52, 10); move it inside or "
     "remove it"},
    {"holes_not_an_array", UTW_E_SYNTAX, 0, -1, -1,
     "part 1: \"holes\" must be an array [...], not an object"},
    {"infinity", UTW_E_SYNTAX, -1, -1, -1,
     "line 2, column 43: Infinity is not a number; every number must be finite and written out"},
    {"key_of_other_case", UTW_E_SYNTAX, -1, -1, -1, "unknown key \"Name\"; did you mean \"name\"?"},
    {"key_twice", UTW_E_SYNTAX, -1, -1, -1, "the key \"units\" is given twice; remove one"},
    {"let_assignment", UTW_E_SYNTAX, -1, -1, -1,
     "dimension \"b\": \"t=4\" is not understood from its character 2 on: \"=4\""},
    {"let_bad_name", UTW_E_SYNTAX, -1, -1, -1,
     "\"t/2\" is no name for a dimension; use a letter, then letters, digits and _, at most 60"},
    {"let_circle", UTW_E_SYNTAX, -1, -1, -1,
     "dimension \"h\": \"b/2\" needs \"b\", whose own value needs this one; break the circle"},
    {"let_cut_off", UTW_E_SYNTAX, -1, -1, -1,
     "dimension \"b\": \"(4+\" ends too early; complete the expression"},
    {"let_divides_by_zero", UTW_E_SYNTAX, -1, -1, -1,
     "dimension \"b\": \"60/(t-4)\" divides by zero"},
    {"let_name_reserved", UTW_E_SYNTAX, -1, -1, -1,
     "\"pi\" already has a meaning in expressions; choose another name"},
    {"let_name_twice", UTW_E_SYNTAX, -1, -1, -1, "dimension \"b\" is defined twice; remove one"},
    {"let_no_value", UTW_E_SYNTAX, -1, -1, -1,
     "dimension \"b\": \"sqrt(-4)\" has no value (such as 0/0, or the root of a negative number)"},
    {"let_not_an_object", UTW_E_SYNTAX, -1, -1, -1,
     "\"let\" must be an object {\"name\": value, ...}, not an array"},
    {"let_too_large", UTW_E_SYNTAX, -1, -1, -1,
     "dimension \"b\": \"10^400\" is a number too large to be held (beyond 1.8e308)"},
    {"let_unknown_name", UTW_E_SYNTAX, -1, -1, -1,
     "dimension \"b\": \"widht/2\" has the unknown name \"widht\"; did you mean \"width\"?"},
    {"let_value_an_array", UTW_E_SYNTAX, -1, -1, -1,
     "dimension \"b\" must be a number, not an array"},
    {"load_a_string", UTW_E_SYNTAX, -1, -1, -1,
     "load 1: \"Vy\": \"100 N\" is not understood from its character 5 on: \"N\""},
    {"load_at_not_a_point", UTW_E_SYNTAX, -1, -1, -1,
     "load 1: \"at\" must be a point [x, y], not a number"},
    {"load_at_without_shear", UTW_E_LOAD, -1, -1, -1,
     "load 1 (\"hook\"): \"at\" is the point where Vx and Vy act, and neither is given; remove "
     "\"at\""},
    {"load_key_of_other_case", UTW_E_SYNTAX, -1, -1, -1,
     "load 1: unknown key \"vy\"; did you mean \"Vy\"?"},
    {"load_name_twice", UTW_E_LOAD, -1, -1, -1,
     "load 2 (\"hook\"): load 1 has the same name; rename one"},
    {"load_unknown_key", UTW_E_SYNTAX, -1, -1, -1,
     "load 1: unknown key \"Fy\"; did you mean \"Vy\"?"},
    {"load_without_force", UTW_E_LOAD, -1, -1, -1,
     "load 1 (\"hook\"): no force or moment is given; give at least one of N, Vx, Vy, T, Mx, My, "
     "B"},
    {"load_without_name", UTW_E_LOAD, -1, -1, -1,
     "load 1: \"name\" is missing; results are reported by it"},
    {"loads_not_an_array", UTW_E_SYNTAX, -1, -1, -1,
     "\"loads\" must be an array [...], not an object"},
    {"loop_crosses_itself", UTW_E_OUTLINE, 0, 0, 3,
     "part 1, outline: the edge to vertex 4 crosses the edge to vertex 2 near (20, 15); move one "
     "of them"},
    {"loop_empty_object", UTW_E_SYNTAX, 0, 0, -1,
     "part 1, outline: \"outline\" is an empty object; it needs \"circle\" or \"ellipse\""},
    {"loop_is_a_string", UTW_E_SYNTAX, 0, 0, -1,
     "part 1, outline: \"outline\" must be an array of vertices, {\"circle\": ...} or "
     "{\"ellipse\": ...}, not a string"},
    {"loop_unknown_key", UTW_E_SYNTAX, 0, 0, -1,
     "part 1, outline: unknown key \"cirle\"; did you mean \"circle\"?"},
    {"material_E_a_string", UTW_E_SYNTAX, -1, -1, -1,
     "material \"alloy\": \"E\": \"70000 MPa\" is not understood from its character 7 on: \"MPa\""},
    {"material_E_zero", UTW_E_MATERIAL, -1, -1, -1,
     "material \"alloy\": \"E\" is 0; the modulus of elasticity must be greater than 0"},
    {"material_density_zero", UTW_E_MATERIAL, -1, -1, -1,
     "material \"alloy\": \"density\" is 0; it must be greater than 0, or left out"},
    {"material_key_is_a_number", UTW_E_SYNTAX, 0, -1, -1,
     "part 1: \"material\" must be the name of a material in double quotes, not a number"},
    {"material_not_defined", UTW_E_MATERIAL, 0, -1, -1,
     "part 1: the material \"alloy\" is not defined; add it to \"materials\""},
    {"material_not_used", UTW_E_MATERIAL, -1, -1, -1,
     "the material \"alloy\" is defined and no part uses it; add \"material\": \"alloy\" to the "
     "part, or remove it"},
    {"material_nu_minus_one", UTW_E_MATERIAL, -1, -1, -1,
     "material \"alloy\": \"nu\" is -1; Poisson's ratio must be greater than -1 and at most 0.5"},
    {"material_nu_too_large", UTW_E_MATERIAL, -1, -1, -1,
     "material \"alloy\": \"nu\" is 0.51; Poisson's ratio must be greater than -1 and at most 0.5"},
    {"material_on_one_part_only", UTW_E_MATERIAL, 1, -1, -1,
     "part 2: \"material\" is missing, while part 1 has one; give every part its material"},
    {"material_twice", UTW_E_MATERIAL, -1, -1, -1,
     "material \"alloy\": is defined twice; remove or rename one"},
    {"material_unknown_key", UTW_E_SYNTAX, -1, -1, -1,
     "material \"alloy\": unknown key \"G\"; known here: E, nu, density, yield"},
    {"material_without_E", UTW_E_MATERIAL, -1, -1, -1,
     "material \"alloy\": \"E\" is missing; give the modulus of elasticity"},
    {"material_without_name", UTW_E_MATERIAL, -1, -1, -1, "material \"\": a material needs a name"},
    {"material_without_nu", UTW_E_MATERIAL, -1, -1, -1,
     "material \"alloy\": \"nu\" is missing; give Poisson's ratio, such as 0.3"},
    {"material_yield_negative", UTW_E_MATERIAL, -1, -1, -1,
     "material \"alloy\": \"yield\" is -250; it must be greater than 0, or left out"},
    {"materials_an_array", UTW_E_SYNTAX, -1, -1, -1,
     "\"materials\" must be an object {\"name\": {\"E\": ..., \"nu\": ...}}, not an array"},
    {"midline_and_parts", UTW_E_SYNTAX, -1, -1, -1,
     "\"parts\" or \"shape\" and \"midline\" are both given; keep one"},
    {"midline_arc_too_narrow", UTW_E_OUTLINE, -1, -1, 0,
     "wall 1 (node 0 to node 1) is 10 thick, too much for its arc of radius 5: it must be less "
     "than twice the radius"},
    {"midline_node_a_number", UTW_E_SYNTAX, -1, -1, -1,
     "midline, node 1: a node must be a point [x, y], not a number"},
    {"midline_node_fraction", UTW_E_SYNTAX, -1, -1, -1,
     "midline, wall 1: \"from\" must be the number of a node (the first is 0), not 0.5"},
    {"midline_node_unknown", UTW_E_OUTLINE, -1, -1, 1,
     "wall 2: node 3 does not exist; there are nodes 0 to 2"},
    {"midline_node_unused", UTW_E_OUTLINE, -1, -1, 2,
     "node 2: no wall ends at it (60, 40); remove it or join it"},
    {"midline_slit_of_no_width", UTW_E_OUTLINE, -1, -1, 3,
     "nodes 0 and 3 both lie at (0, 0): a slit of no width cannot be thickened; move them apart by "
     "its width, or make them one node"},
    {"midline_too_far_away", UTW_E_OUTLINE, -1, -1, -1,
     "the section is 60.8276 long but lies 1e+09 away from the origin, so that its coordinates "
     "have too few digits left: move it toward the origin"},
    {"midline_wall_thickness_zero", UTW_E_OUTLINE, -1, -1, 0,
     "wall 1: thickness 3 at node 0, 0 at node 1; it must be positive"},
    {"midline_wall_three_thicknesses", UTW_E_SYNTAX, -1, -1, -1,
     "midline, wall 1: \"t\" must be a thickness or [thickness at from, thickness at to]; it has 3 "
     "members"},
    {"midline_wall_too_short", UTW_E_OUTLINE, -1, -1, 1,
     "wall 2 (node 1 to node 2) is too short for the thicknesses at its ends: of its length 6 the "
     "corners take 1.5 at node 1 and 7 at node 2; lengthen it or make the walls thinner"},
    {"midline_wall_unknown_key", UTW_E_SYNTAX, -1, -1, -1,
     "midline, wall 1: unknown key \"thick\"; known here: from, to, t, arc"},
    {"midline_wall_without_t", UTW_E_SYNTAX, -1, -1, -1,
     "midline, wall 2: \"t\" is missing; a wall needs \"from\", \"to\" and \"t\""},
    {"midline_walls_cross", UTW_E_OUTLINE, -1, -1, 3,
     "walls 1 and 4 cross at (20, 0), where no node joins them; put a node there"},
    {"midline_walls_empty", UTW_E_OUTLINE, -1, -1, -1,
     "\"walls\" is empty; give at least one wall"},
    {"midline_walls_run_together", UTW_E_OUTLINE, -1, -1, 4,
     "walls 1 and 5, thickened, run into one another near (1.5, 21); make them thinner or move "
     "them apart"},
    {"midline_without_nodes", UTW_E_SYNTAX, -1, -1, -1,
     "\"midline\" needs \"nodes\" and \"walls\"; \"nodes\" is missing"},
    {"midline_without_walls", UTW_E_SYNTAX, -1, -1, -1,
     "\"midline\" needs \"nodes\" and \"walls\"; \"walls\" is missing"},
    {"name_is_a_number", UTW_E_SYNTAX, -1, -1, -1,
     "\"name\" must be a text in double quotes, not a number"},
    {"name_too_long", UTW_E_SYNTAX, -1, -1, -1,
     "\"name\" is 201 bytes long; at most 200 are allowed"},
    {"name_with_line_break", UTW_E_SYNTAX, -1, -1, -1,
     "\"name\" holds a line break or another control character; remove it"},
    {"nan", UTW_E_SYNTAX, -1, -1, -1,
     "line 2, column 42: NaN is not a number; every number must be finite and written out"},
    {"no_parts", UTW_E_OUTLINE, -1, -1, -1, "\"parts\" is missing; the section has no outline"},
    {"no_units", UTW_E_SYNTAX, -1, -1, -1,
     "\"units\" is missing; add, for example, \"units\": \"mm N\""},
    {"no_vertices", UTW_E_OUTLINE, 0, 0, -1,
     "part 1, outline: the loop has no vertices; at least three are needed"},
    {"not_an_object", UTW_E_SYNTAX, -1, -1, -1,
     "the section must be an object {...}, not an array"},
    {"not_utf8", UTW_E_SYNTAX, -1, -1, -1,
     "line 1, column 13: this is not UTF-8 text; save the file as UTF-8"},
    {"nul", UTW_E_SYNTAX, -1, -1, -1,
     "line 1, column 18: the text holds a NUL byte; this is not a section file"},
    {"number_too_large", UTW_E_SYNTAX, 0, 0, 2,
     "part 1, outline, vertex 3: x of the vertex is a number too large to be held (beyond "
     "1.8e308)"},
    {"one_vertex", UTW_E_OUTLINE, 0, 0, -1,
     "part 1, outline: the loop has one vertex; at least three are needed; for a circle write "
     "{\"circle\": [xc, yc, r]}"},
    {"part_not_an_object", UTW_E_SYNTAX, 0, -1, -1,
     "part 1: the part must be an object {...}, not an array"},
    {"part_unknown_key", UTW_E_SYNTAX, 0, -1, -1,
     "part 1: unknown key \"outlin\"; did you mean \"outline\"?"},
    {"part_without_outline", UTW_E_OUTLINE, 0, -1, -1,
     "part 1: \"outline\" is missing; give the vertices of the outer loop"},
    {"parts_empty", UTW_E_OUTLINE, -1, -1, -1, "\"parts\" is empty; give at least one part"},
    {"parts_not_an_array", UTW_E_SYNTAX, -1, -1, -1,
     "\"parts\" must be an array [...], not an object"},
    {"parts_overlap", UTW_E_OUTLINE, 1, 0, 1,
     "parts 1 and 2 overlap: the edge to vertex 2 of part 2 crosses the edge to vertex 3 of part 1 "
     "near (40, 10); cut one out of the other"},
    {"round_does_not_fit", UTW_E_OUTLINE, 0, 0, 2,
     "part 1, outline, vertex 3: \"round\": 31 does not fit between its two edges; the greatest "
     "that fits is 30"},
    {"round_without_corner", UTW_E_OUTLINE, 0, 0, 1,
     "part 1, outline, vertex 2: \"round\" has no corner to work on: the outline runs straight on "
     "through this vertex; leave it out"},
    {"round_zero", UTW_E_OUTLINE, 0, 0, 2,
     "part 1, outline, vertex 3: \"round\" is 0; it must be greater than 0, or left out"},
    {"rounds_do_not_fit", UTW_E_OUTLINE, 0, 0, 3,
     "part 1, outline, vertex 4: \"round\": 20 does not fit beside \"round\": 25 of vertex 3: the "
     "edge between them is 40 long; the greatest that fits here is 15, or there 20"},
    {"same_vertex_twice", UTW_E_OUTLINE, 0, 0, 2,
     "part 1, outline, vertex 3: (40, 0) is the same point as vertex 2; remove one of them"},
    {"shape_and_holes", UTW_E_SYNTAX, 0, -1, -1,
     "part 1: \"shape\" and \"holes\" are both given; keep one"},
    {"shape_and_outline", UTW_E_SYNTAX, 0, -1, -1,
     "part 1: \"shape\" and \"outline\" are both given; keep one"},
    {"shape_and_parts", UTW_E_SYNTAX, -1, -1, -1,
     "\"parts\" and \"shape\" are both given; keep one"},
    {"shape_dimension_does_not_fit", UTW_E_OUTLINE, 1, -1, -1,
     "part 2: channel: r = 60 does not fit: at most 42 with h = 100, b = 50, tf = 8, tw = 6"},
    {"shape_dimension_expression", UTW_E_SYNTAX, -1, -1, -1,
     "tube: d: \"2*v\" has the unknown name \"v\"; define it in \"let\""},
    {"shape_dimension_missing", UTW_E_SYNTAX, -1, -1, -1,
     "tube: t (wall thickness) is missing: it needs a value"},
    {"shape_dimension_true", UTW_E_SYNTAX, -1, -1, -1,
     "tube: d must be a number, not true or false"},
    {"shape_dimension_twice", UTW_E_SYNTAX, -1, -1, -1, "tube: d is given twice"},
    {"shape_dimension_unknown", UTW_E_SYNTAX, -1, -1, -1,
     "tube: there is no dimension \"D\"; it has d, t"},
    {"shape_far_away", UTW_E_OUTLINE, -1, -1, -1,
     "the section is 28.2843 long but lies 1e+09 away from the origin, so that its coordinates "
     "have too few digits left: move it toward the origin"},
    {"shape_is_a_string", UTW_E_SYNTAX, -1, -1, -1,
     "\"shape\" must be an object {...}, not a string"},
    {"shape_material_in_part", UTW_E_SYNTAX, 0, -1, -1,
     "part 1: unknown key \"material\"; known here: rectangle, round, ellipse, polygon, trapezium, "
     "tube, box, slit-tube, arc-strip, angle, channel, I, tee, zed, cruciform, bulb, hat, "
     "formed-channel, formed-zed, keyed-shaft, splined-shaft, aerofoil, at, turn, mirror"},
    {"shape_mirror_a_number", UTW_E_SYNTAX, -1, -1, -1,
     "\"mirror\" must be true or false, not a number"},
    {"shape_name_is_a_number", UTW_E_SYNTAX, -1, -1, -1,
     "\"round\" must be an object of dimensions, such as {\"h\": 100}, not a number"},
    {"shape_turn_unknown", UTW_E_SYNTAX, -1, -1, -1,
     "\"turn\": \"left\" has the unknown name \"left\"; define it in \"let\""},
    {"shape_twice", UTW_E_SYNTAX, -1, -1, -1, "\"shape\" is both \"round\" and \"tube\"; keep one"},
    {"shape_unknown", UTW_E_SYNTAX, -1, -1, -1,
     "unknown key \"chanel\"; did you mean \"channel\"?"},
    {"shape_without_name", UTW_E_SYNTAX, -1, -1, -1,
     "\"shape\" names no shape; add one, such as \"angle\": {\"h\": 50, \"t\": 5}"},
    {"through_empty", UTW_E_SYNTAX, 0, 0, 2,
     "part 1, outline, vertex 3: \"through\" is empty; list the points between the two vertices, "
     "or leave it out"},
    {"through_same_point", UTW_E_OUTLINE, 0, 0, 2,
     "part 1, outline, vertex 3: points 1 and 2 of \"through\" are the same, (45, 12); remove one"},
    {"trailing_text", UTW_E_SYNTAX, -1, -1, -1,
     "line 3, column 1: text follows the end of the section; remove it"},
    {"two_vertices", UTW_E_OUTLINE, 0, 0, -1,
     "part 1, outline: the loop has 2 vertices; at least three are needed, or two when one of the "
     "edges is curved"},
    {"units_are_a_number", UTW_E_SYNTAX, -1, -1, -1,
     "\"units\" must be a text in double quotes, not a number"},
    {"units_turned_round", UTW_E_SYNTAX, -1, -1, -1,
     "\"units\" is \"N mm\"; the length comes first: \"mm N\""},
    {"unknown_key", UTW_E_SYNTAX, -1, -1, -1, "unknown key \"laods\"; did you mean \"loads\"?"},
    {"unknown_key_far", UTW_E_SYNTAX, -1, -1, -1,
     "unknown key \"comment\"; known here: let, name, units, materials, parts, shape, midline, "
     "loads"},
    {"unknown_units", UTW_E_SYNTAX, -1, -1, -1,
     "\"units\" is \"mm kgf\"; it must be a length (mm, cm, m, in, ft), a blank and a force (N, "
     "kN, MN, lbf, kip), such as \"mm N\""},
    {"vertex_is_a_number", UTW_E_SYNTAX, 0, 0, 0,
     "part 1, outline, vertex 1: a vertex must be a point [x, y] or an object {\"at\": [x, y], "
     "...}, not a number"},
    {"vertex_key_twice", UTW_E_SYNTAX, 0, 0, 2,
     "part 1, outline, vertex 3: the key \"at\" is given twice; remove one"},
    {"vertex_null", UTW_E_SYNTAX, 0, 0, 2,
     "part 1, outline, vertex 3: x of the vertex must be a number, not null"},
    {"vertex_radius", UTW_E_SYNTAX, 0, 0, 2,
     "part 1, outline, vertex 3: unknown key \"radius\"; known here: at, round, chamfer, arc, "
     "bulge, bezier, through"},
    {"vertex_round_and_chamfer", UTW_E_SYNTAX, 0, 0, 2,
     "part 1, outline, vertex 3: a corner is rounded or cut, not both; keep one of \"round\", "
     "\"chamfer\""},
    {"vertex_three_numbers", UTW_E_SYNTAX, 0, 0, 1,
     "part 1, outline, vertex 2: the vertex must be a point [x, y]; it has 3 members"},
    {"vertex_two_edges", UTW_E_SYNTAX, 0, 0, 2,
     "part 1, outline, vertex 3: the edge to this vertex is given in two ways; keep one of "
     "\"arc\", \"bulge\", \"bezier\", \"through\""},
    {"vertex_unknown_key", UTW_E_SYNTAX, 0, 0, 2,
     "part 1, outline, vertex 3: unknown key \"rond\"; did you mean \"round\"?"},
    {"vertex_without_at", UTW_E_SYNTAX, 0, 0, 2,
     "part 1, outline, vertex 3: \"at\" is missing; give the point [x, y] of the vertex"},
};
enum { N_ROW = sizeof row / sizeof row[0] };

static void each_file_is_refused_with_its_message(void **state)
{
    (void)state;
    for (int i = 0; i < N_ROW; i++) {
        char path[80], message[700];
        utw_outline *outline = NULL;
        utw_error err;
        snprintf(path, sizeof path, "%s.json", row[i].name);
        snprintf(message, sizeof message, "%s: %s", path, row[i].message);
        const utw_status st = utw_outline_read(path, &outline, &err);
        if (st == UTW_OK) print_error("%s is accepted\n", path);
        assert_int_equal(st, row[i].status);
        assert_string_equal(err.text, message);
        assert_int_equal(err.status, row[i].status);
        assert_int_equal(err.part, row[i].part);
        assert_int_equal(err.loop, row[i].loop);
        assert_int_equal(err.vertex, row[i].vertex);
        assert_null(outline);
    }
}

static void no_file_is_left_out(void **state)
{
    (void)state;
    DIR *folder = opendir(".");
    assert_non_null(folder);
    int n = 0;
    for (const struct dirent *entry; (entry = readdir(folder)) != NULL;)
        n += strstr(entry->d_name, ".json") != NULL;
    closedir(folder);
    assert_int_equal(n, N_ROW);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(each_file_is_refused_with_its_message),
        cmocka_unit_test(no_file_is_left_out),
    };
    if (chdir(UTW_SOURCE_DIR "/tests/bad") != 0) return 1;
    return cmocka_run_group_tests(tests, NULL, NULL);
}
