# Writes a C++ source whose functions return the text of files: <stem of the file>() in NAMESPACE, as HEADER declares.
# cmake -DOUTPUT=<source> -DHEADER=<header> -DNAMESPACE=<namespace> "-DINPUTS=<file>;<file>" -P embed.cmake
cmake_minimum_required(VERSION 3.25)

set(source "#include \"${HEADER}\"\n\nnamespace ${NAMESPACE} {\n")
foreach(input IN LISTS INPUTS)
  cmake_path(GET input STEM function)
  file(READ "${input}" text)
  string(FIND "${text}" ")table\"" clash)
  if(NOT clash EQUAL -1)
    message(FATAL_ERROR "${input} holds )table\", which would end the literal it becomes")
  endif()
  string(APPEND source "\nstd::string_view ${function}() {\n  return R\"table(${text})table\";\n}\n")
endforeach()
string(APPEND source "\n}  // namespace ${NAMESPACE}\n")
file(WRITE "${OUTPUT}" "${source}")
