cmake_minimum_required(VERSION 3.25)
include(${CMAKE_CURRENT_LIST_DIR}/planted.cmake)
set(script top_level.cmake)

clean_tree()
plant(.clang-format "")
plant(build-asan/CMakeCache.txt "")
accepted(${script})

plant(CMakePresets.json "")
plant(docs/index.md "")
plant(builder.sh "")
file(REMOVE_RECURSE ${SCRATCH}/LICENSE ${SCRATCH}/README.md ${SCRATCH}/data ${SCRATCH}/core)
refused(${script} "CMakePresets.json: does not belong" "docs: does not belong" "builder.sh: does not belong"
        "LICENSE: the file is missing" "README.md: the file is missing" "data: the folder is missing"
        "core: the folder is missing")
