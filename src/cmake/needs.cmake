# SPDX-License-Identifier: GPL-3.0-or-later
# The libraries untwist stands on, as targets; used by the build and, installed, by untwist-config.cmake.
# What is not found is listed in untwist_missing.
find_package(PkgConfig QUIET)
set(untwist_missing)
if(NOT PkgConfig_FOUND)
  list(APPEND untwist_missing pkg-config)
else()
  foreach(need cjson:libcjson muparser:muparser cairo:cairo cairo_pdf:cairo-pdf cairo_svg:cairo-svg zlib:zlib lapack:lapack
      blas:blas)
    string(REPLACE ":" ";" need ${need})
    list(GET need 0 name)
    list(GET need 1 module)
    pkg_check_modules(untwist_${name} QUIET IMPORTED_TARGET ${module})
    if(NOT untwist_${name}_FOUND)
      list(APPEND untwist_missing ${module})
    endif()
  endforeach()
endif()

# Debian's packages of Gmsh and CHOLMOD hold no pkg-config file, that of Gmsh no CMake file.
find_path(UNTWIST_GMSH_INCLUDE_DIR gmshc.h)
find_library(UNTWIST_GMSH_LIBRARY gmsh)
find_path(UNTWIST_CHOLMOD_INCLUDE_DIR cholmod.h PATH_SUFFIXES suitesparse)
find_library(UNTWIST_CHOLMOD_LIBRARY cholmod)
mark_as_advanced(UNTWIST_GMSH_INCLUDE_DIR UNTWIST_GMSH_LIBRARY UNTWIST_CHOLMOD_INCLUDE_DIR UNTWIST_CHOLMOD_LIBRARY)
foreach(name gmsh cholmod)
  string(TOUPPER ${name} NAME)
  if(NOT UNTWIST_${NAME}_INCLUDE_DIR OR NOT UNTWIST_${NAME}_LIBRARY)
    list(APPEND untwist_missing ${name})
  elseif(NOT TARGET untwist::${name})
    add_library(untwist::${name} UNKNOWN IMPORTED)
    set_target_properties(untwist::${name} PROPERTIES
      IMPORTED_LOCATION ${UNTWIST_${NAME}_LIBRARY} INTERFACE_INCLUDE_DIRECTORIES ${UNTWIST_${NAME}_INCLUDE_DIR})
  endif()
endforeach()
set(untwist_needs untwist::gmsh untwist::cholmod PkgConfig::untwist_cjson PkgConfig::untwist_muparser
  PkgConfig::untwist_cairo PkgConfig::untwist_cairo_pdf PkgConfig::untwist_cairo_svg PkgConfig::untwist_zlib PkgConfig::untwist_lapack
  PkgConfig::untwist_blas m)
