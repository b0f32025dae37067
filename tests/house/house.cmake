# What the scripts of the house share. Each takes ROOT, the folder to look at, and ends with an error that lists every
# breach as `file:line: what`.
cmake_minimum_required(VERSION 3.25)

if(NOT DEFINED ROOT)
  message(FATAL_ERROR "say which tree to look at: cmake -DROOT=<folder> -P <script>")
endif()
set(breaches "")

macro(breach text)
  string(APPEND breaches "\n  ${text}")
endmacro()

macro(end_of_script rule)
  if(breaches)
    message(FATAL_ERROR "${rule}:${breaches}")
  endif()
endmacro()

# Sets `result` to the sources and headers of a folder, as paths from ROOT.
function(sources_of folder result)
  file(GLOB_RECURSE list RELATIVE ${ROOT} ${ROOT}/${folder}/*.cpp ${ROOT}/${folder}/*.hpp)
  set(${result} ${list} PARENT_SCOPE)
endfunction()

# Sets `result` to the lines of a file as a list. Brackets, semicolons and backslashes, which lists of CMake do not
# bear, become the characters that the other arguments show: ( ) | /
function(lines_of file result)
  file(READ ${ROOT}/${file} text)
  string(REPLACE "\\" "/" text "${text}")
  string(REPLACE "[" "(" text "${text}")
  string(REPLACE "]" ")" text "${text}")
  string(REPLACE ";" "|" text "${text}")
  string(REPLACE "\n" ";" text "${text}")
  set(${result} "${text}" PARENT_SCOPE)
endfunction()

# Sets `result` to a line without what stands in quotes and without a comment that ends it.
function(code_of line result)
  string(REPLACE "'\"'" "' '" code "${line}")
  string(REPLACE "/\"" "  " code "${code}")
  string(REGEX REPLACE "\"[^\"]*\"" "\"\"" code "${code}")
  string(REGEX REPLACE "//.*" "" code "${code}")
  set(${result} "${code}" PARENT_SCOPE)
endfunction()
