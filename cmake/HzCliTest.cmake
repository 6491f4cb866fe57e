# Command-line tests: a line as a person would type it, what it prints and how it ends.
#
#   hz_cli_test(NAME LINE [EXIT n])
#
# LINE runs under bash in an empty folder in which `lists` is tests/cli/lists and `lantern.csv` the invented list; hzmap is on
# the path. NAME is folder/case: beside this test lie case.out (standard output, byte for byte) and case.err (standard error);
# where a file is absent nothing may be printed. `HZ_RENEW=1 ctest` writes them anew, to be looked at before a commit. No `;` in LINE.
function(hz_cli_test name line)
  cmake_parse_arguments(PARSE_ARGV 2 arg "" "EXIT" "")
  if(NOT DEFINED arg_EXIT)
    set(arg_EXIT 0)
  endif()
  add_test(
    NAME cli/${name}
    COMMAND bash "${PROJECT_SOURCE_DIR}/tests/cli/run_one.sh"
            "$<TARGET_FILE:hzmap>" "${CMAKE_CURRENT_SOURCE_DIR}/${name}" "${arg_EXIT}" "${line}")
  set_tests_properties(cli/${name} PROPERTIES TIMEOUT 60)
endfunction()
