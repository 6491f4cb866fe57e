# Run by ctest with BUILD, STRANGER, WORK, CXX, CXX_FLAGS and CATALOGS.
cmake_minimum_required(VERSION 3.25)
set(prefix "${WORK}/prefix")
file(REMOVE_RECURSE "${prefix}" "${WORK}/stranger")  # what an earlier run left must not help this one

function(run)
  execute_process(COMMAND ${ARGV} OUTPUT_VARIABLE out ERROR_VARIABLE out RESULT_VARIABLE code)
  if(code)
    list(JOIN ARGV " " command)
    message(FATAL_ERROR "failed: ${command}\n${out}")
  endif()
  set(out "${out}" PARENT_SCOPE)
endfunction()

function(expect_file relative)
  if(NOT EXISTS "${prefix}/${relative}")
    message(FATAL_ERROR "not installed: ${relative}")
  endif()
endfunction()

run("${CMAKE_COMMAND}" --install "${BUILD}" --prefix "${prefix}")
expect_file(bin/hzmap)
expect_file(share/man/man1/hzmap.1)
expect_file(share/doc/hzmap/LICENSE)
run("${CMAKE_COMMAND}" -E compare_files "${CATALOGS}/lantern/lantern.csv" "${prefix}/share/hzmap/lantern/lantern.csv")
run("${CMAKE_COMMAND}" -E compare_files "${CATALOGS}/limits.toml" "${prefix}/share/hzmap/limits.toml")

run("${prefix}/bin/hzmap" --version)
if(NOT out MATCHES "hzmap [0-9]+\\.[0-9]+\\.[0-9]+")
  message(FATAL_ERROR "the installed program does not tell its version: ${out}")
endif()

run("${CMAKE_COMMAND}" -G Ninja -S "${STRANGER}" -B "${WORK}/stranger"
  "-DCMAKE_PREFIX_PATH=${prefix}" "-DCMAKE_CXX_COMPILER=${CXX}" "-DCMAKE_CXX_FLAGS=${CXX_FLAGS}")
run("${CMAKE_COMMAND}" --build "${WORK}/stranger")
run("${WORK}/stranger/stranger")
if(NOT out STREQUAL "runaway greenhouse of 1 Earth mass at 5780 K: 1.107\n")
  message(FATAL_ERROR "the stranger's program printed: ${out}")
endif()
