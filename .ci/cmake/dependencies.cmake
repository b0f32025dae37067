# Every library comes from the distribution. A missing one ends the configuration with the package that cures it.

function(swaymark_needs found library package)
  if(NOT ${found})
    message(FATAL_ERROR "${library} was not found. On Debian and Ubuntu: apt-get install ${package} "
                        "(bash .ci/install installs all that is needed).")
  endif()
endfunction()

find_package(Eigen3 3.4 QUIET NO_MODULE)
swaymark_needs(Eigen3_FOUND "Eigen 3.4" libeigen3-dev)

# Spectra's own package file asks for an exact Eigen; its headers are all that is needed.
find_path(SPECTRA_INCLUDE_DIR Spectra/SymEigsSolver.h)
swaymark_needs(SPECTRA_INCLUDE_DIR Spectra libspectra-dev)

find_package(yaml-cpp 0.7 QUIET)
swaymark_needs(yaml-cpp_FOUND "yaml-cpp 0.7" libyaml-cpp-dev)

find_package(fmt 9 QUIET)
swaymark_needs(fmt_FOUND "fmt 9" libfmt-dev)

find_package(CLI11 2 QUIET)
swaymark_needs(CLI11_FOUND "CLI11 2" libcli11-dev)

find_package(nlohmann_json 3 QUIET)
swaymark_needs(nlohmann_json_FOUND "nlohmann/json 3" nlohmann-json3-dev)

find_path(UDUNITS2_INCLUDE_DIR udunits2.h)
find_library(UDUNITS2_LIBRARY udunits2)
if(UDUNITS2_INCLUDE_DIR AND UDUNITS2_LIBRARY)
  set(UDUNITS2_FOUND TRUE)
endif()
swaymark_needs(UDUNITS2_FOUND "UDUNITS-2" libudunits2-dev)

find_path(LIBMD_INCLUDE_DIR sha2.h)
find_library(LIBMD_LIBRARY md)
if(LIBMD_INCLUDE_DIR AND LIBMD_LIBRARY)
  set(LIBMD_FOUND TRUE)
endif()
swaymark_needs(LIBMD_FOUND "libmd (SHA-256)" libmd-dev)

if(SWAYMARK_TESTS)
  find_package(Catch2 2.13 QUIET)
  swaymark_needs(Catch2_FOUND "Catch2 2.13" catch2)
endif()

# Libraries without a package file of their own, as imported targets: their warnings stay theirs.
add_library(swaymark::spectra INTERFACE IMPORTED)
target_include_directories(swaymark::spectra INTERFACE ${SPECTRA_INCLUDE_DIR})
add_library(swaymark::udunits INTERFACE IMPORTED)
target_include_directories(swaymark::udunits INTERFACE ${UDUNITS2_INCLUDE_DIR})
target_link_libraries(swaymark::udunits INTERFACE ${UDUNITS2_LIBRARY})
add_library(swaymark::libmd INTERFACE IMPORTED)
target_include_directories(swaymark::libmd INTERFACE ${LIBMD_INCLUDE_DIR})
target_link_libraries(swaymark::libmd INTERFACE ${LIBMD_LIBRARY})
