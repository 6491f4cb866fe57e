# Build kind that finds memory errors and undefined behaviour:  cmake -C cmake/sanitize.cmake -G Ninja -B build-sanitize
# -O1 keeps the suite quick; the first finding ends the program, so that a test fails on it.
set(CMAKE_BUILD_TYPE Debug CACHE STRING "Kind of build" FORCE)
set(CMAKE_CXX_FLAGS
  "-O1 -fno-omit-frame-pointer -fsanitize=address,undefined -fno-sanitize-recover=all -D_GLIBCXX_ASSERTIONS"
  CACHE STRING "Flags of every kind of build" FORCE)
