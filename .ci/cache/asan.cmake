# First cache values of the sanitizer build: cmake -C .ci/cache/asan.cmake ...
# The checks of every pointer for null, alignment and type double the time of compiling; a null pointer ends the run
# all the same. GCC 12 sees uninitialised members in instrumented library code (std::regex) where there are none.
# -O1 and -g1 keep compiling short, and tests that are not optimised shorter still; without NDEBUG the assertions of
# Eigen are on.
set(CMAKE_BUILD_TYPE RelWithDebInfo CACHE STRING "")
set(CMAKE_CXX_FLAGS "-fsanitize=address,undefined -fno-sanitize=null,alignment,vptr -fno-sanitize-recover=all -fno-omit-frame-pointer -Wno-maybe-uninitialized" CACHE STRING "")
set(CMAKE_CXX_FLAGS_RELWITHDEBINFO "-O1 -g1" CACHE STRING "")
set(SWAYMARK_TEST_FLAGS "-O0" CACHE STRING "")
set(SWAYMARK_PRECOMPILE ON CACHE BOOL "")
