# Build kind for daily work: debugging symbols, checked containers.  cmake -C cmake/dev.cmake -G Ninja -B build-dev
set(CMAKE_BUILD_TYPE RelWithDebInfo CACHE STRING "Kind of build" FORCE)
set(CMAKE_CXX_FLAGS_RELWITHDEBINFO "-O1 -g" CACHE STRING "Checks of our own stay on (no NDEBUG)" FORCE)
set(CMAKE_CXX_FLAGS "-D_GLIBCXX_ASSERTIONS" CACHE STRING "Flags of every kind of build" FORCE)
set(CMAKE_EXPORT_COMPILE_COMMANDS ON CACHE BOOL "For clang-tidy and editors" FORCE)
find_program(hz_ccache ccache)
if(hz_ccache)
  set(CMAKE_CXX_COMPILER_LAUNCHER "${hz_ccache}" CACHE STRING "Remembers what was compiled before" FORCE)
endif()
