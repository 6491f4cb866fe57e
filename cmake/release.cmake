# Build kind for use, for speed and for the tests of what is shipped:  cmake -C cmake/release.cmake -G Ninja -B build
# -O2: -O3 gains nothing measurable here, builds longer, and g++ 12 raises false alarms inside its own library with it.
set(CMAKE_BUILD_TYPE Release CACHE STRING "Kind of build" FORCE)
set(CMAKE_CXX_FLAGS_RELEASE "-O2 -DNDEBUG" CACHE STRING "Flags of this kind" FORCE)
set(CMAKE_EXPORT_COMPILE_COMMANDS ON CACHE BOOL "For clang-tidy and editors" FORCE)
