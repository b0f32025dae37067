# What every target of the house shares: the language level, and warnings as errors in our own build only.

function(swaymark_target_settings target)
  target_compile_features(${target} PUBLIC cxx_std_20)
  set_target_properties(${target} PROPERTIES CXX_EXTENSIONS OFF)
  # Eigen then refuses to give its few parts under a stricter licence.
  target_compile_definitions(${target} PRIVATE EIGEN_MPL2_ONLY)
  if(PROJECT_IS_TOP_LEVEL)
    target_compile_options(${target} PRIVATE -Wall -Wextra -Wpedantic -Wshadow -Wconversion -Wold-style-cast
                                             -Wnon-virtual-dtor -Woverloaded-virtual -Werror)
    # GCC 12 sees an overlap in "text" + std::string that is not there (its bug 105651).
    target_compile_options(${target} PRIVATE $<$<CXX_COMPILER_ID:GNU>:-Wno-restrict>)
  endif()
endfunction()

# swaymark_precompile(<target> <target that has them>): shares headers precompiled once, where they are asked for.
function(swaymark_precompile target owner)
  if(SWAYMARK_PRECOMPILE)
    target_precompile_headers(${target} REUSE_FROM ${owner})
  endif()
endfunction()

# swaymark_embed(<variable> <namespace> <folder of data/> <suffix> <names>...): a source with the text of files, which the
# program then does not need when it runs; <folder of this>/<namespace>.hpp declares its functions.
function(swaymark_embed variable namespace folder suffix)
  set(inputs ${ARGN})
  list(TRANSFORM inputs PREPEND ${PROJECT_SOURCE_DIR}/data/${folder}/)
  list(TRANSFORM inputs APPEND ${suffix})
  set(output ${CMAKE_CURRENT_BINARY_DIR}/${namespace}.cpp)
  cmake_path(GET CMAKE_CURRENT_SOURCE_DIR FILENAME here)
  set(script ${PROJECT_SOURCE_DIR}/.ci/cmake/embed.cmake)
  add_custom_command(
    OUTPUT ${output}
    COMMAND ${CMAKE_COMMAND} -DOUTPUT=${output} -DHEADER=${here}/${namespace}.hpp -DNAMESPACE=swaymark::${namespace}
            "-DINPUTS=${inputs}" -P ${script}
    DEPENDS ${inputs} ${script}
    COMMENT "Embedding data/${folder}"
    VERBATIM)
  set(${variable} ${output} PARENT_SCOPE)
endfunction()

# swaymark_library(<folder> SOURCES ... HEADERS ... LINKS ... PRIVATE_LINKS ...)
# makes the target swaymark_<folder> with the name swaymark::<folder>, the same before and after installing.
function(swaymark_library folder)
  cmake_parse_arguments(ARG "" "" "SOURCES;HEADERS;LINKS;PRIVATE_LINKS" ${ARGN})
  set(target swaymark_${folder})
  add_library(${target} STATIC ${ARG_SOURCES})
  add_library(swaymark::${folder} ALIAS ${target})
  set_target_properties(${target} PROPERTIES EXPORT_NAME ${folder})
  target_sources(${target} PUBLIC FILE_SET HEADERS BASE_DIRS ${PROJECT_SOURCE_DIR} FILES ${ARG_HEADERS})
  target_link_libraries(${target} PUBLIC ${ARG_LINKS})
  target_link_libraries(${target} PRIVATE ${ARG_PRIVATE_LINKS})
  swaymark_target_settings(${target})
endfunction()
