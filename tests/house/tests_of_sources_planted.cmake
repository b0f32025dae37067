cmake_minimum_required(VERSION 3.25)
include(${CMAKE_CURRENT_LIST_DIR}/planted.cmake)
set(script tests_of_sources.cmake)

clean_tree()
plant(core/header_only.hpp "")
accepted(${script})

set(messages "")
foreach(folder core modal spectrum apps)
  plant(${folder}/new.cpp "")
  list(APPEND messages "${folder}/new.cpp: has no test")
endforeach()
plant(core/main.cpp "")
# A test of that name in another folder is not enough.
plant(core/other.cpp "")
plant(tests/modal/other_test.cpp "")
refused(${script} ${messages} "core/main.cpp: has no test" "core/other.cpp: has no test")
