# Every source has a test of the same name; only the program's main, which is one call, has none of its own.
cmake_minimum_required(VERSION 3.25)
include(${CMAKE_CURRENT_LIST_DIR}/house.cmake)

set(without_test apps/main.cpp)

foreach(folder core modal spectrum apps)
  sources_of(${folder} files)
  foreach(file IN LISTS files)
    if(NOT file MATCHES "[.]cpp$" OR file IN_LIST without_test)
      continue()
    endif()
    string(REGEX REPLACE "[.]cpp$" "_test.cpp" test "tests/${file}")
    if(NOT EXISTS ${ROOT}/${test})
      breach("${file}: has no test; write ${test}")
    endif()
  endforeach()
endforeach()

end_of_script("sources without a test of the same name")
