# Proves that a script of the house can fail: it must accept a small clean tree, and refuse that tree with one breach
# planted, naming its place. Needs SCRATCH, a folder to plant in.
cmake_minimum_required(VERSION 3.25)

set(CLEAN_SOURCE [[
#include <string>

#include <Eigen/Core>
#include <fmt/format.h>

namespace swaymark {

namespace {

constexpr double kLimit = 0.5;  // exit(1) in a comment
const std::string kName = "printf(std::cerr)";

static double half(double value) { return kLimit * value; }

}  // namespace

std::string name() { return fmt::format("{} {}", kName, half(2.0)); }

}  // namespace swaymark
]])

function(plant file text)
  file(WRITE ${SCRATCH}/${file} "${text}")
endfunction()

function(clean_tree)
  file(REMOVE_RECURSE ${SCRATCH})
  foreach(file CMakeLists.txt README.md DEVELOPERS.md LICENSE data/tower.yaml apps/main.cpp build-x/a.cpp .hidden/a.cpp)
    plant(${file} "")
  endforeach()
  foreach(folder core modal spectrum apps)
    plant(${folder}/clean.cpp "${CLEAN_SOURCE}")
    plant(tests/${folder}/clean_test.cpp "")
  endforeach()
endfunction()

function(run_script script status output)
  execute_process(COMMAND ${CMAKE_COMMAND} -DROOT=${SCRATCH} -P ${CMAKE_CURRENT_LIST_DIR}/${script}
                  RESULT_VARIABLE ended OUTPUT_VARIABLE text ERROR_VARIABLE text)
  set(${status} ${ended} PARENT_SCOPE)
  # Long messages come wrapped.
  string(REGEX REPLACE "[ \n]+" " " text "${text}")
  set(${output} "${text}" PARENT_SCOPE)
endfunction()

# accepted(<script>): the tree as it is passes.
function(accepted script)
  run_script(${script} status output)
  if(NOT status EQUAL 0)
    message(SEND_ERROR "${script} refuses what it should accept:\n${output}")
  endif()
endfunction()

# plant_line(<file> <line> [<message>]): adds a line to a file, and the message that is expected to name it.
function(plant_line file line)
  file(APPEND ${SCRATCH}/${file} "${line}\n")
  get_property(number GLOBAL PROPERTY "LINES ${file}")
  if(NOT number)
    set(number 0)
  endif()
  math(EXPR number "${number} + 1")
  set_property(GLOBAL PROPERTY "LINES ${file}" ${number})
  if(ARGC GREATER 2)
    set_property(GLOBAL APPEND PROPERTY EXPECTED "${file}:${number}: ${ARGV2}")
  endif()
endfunction()

# refused(<script> <message>...): the tree as it is is refused with all these messages and those of planted lines.
function(refused script)
  run_script(${script} status output)
  get_property(planted GLOBAL PROPERTY EXPECTED)
  if(status EQUAL 0)
    message(SEND_ERROR "${script} accepts a tree it should refuse")
  endif()
  foreach(expected ${ARGN} ${planted})
    string(FIND "${output}" " ${expected}" found)
    if(found EQUAL -1)
      message(SEND_ERROR "${script} does not say: ${expected}\nbut: ${output}")
    endif()
  endforeach()
endfunction()
