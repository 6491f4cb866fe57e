# Build kind for use, for speed and for the tests of what is shipped:  cmake -C cmake/release.cmake -G Ninja -B build
set(CMAKE_BUILD_TYPE Release CACHE STRING "Kind of build" FORCE)
set(CMAKE_EXPORT_COMPILE_COMMANDS ON CACHE BOOL "For clang-tidy and editors" FORCE)
