# Test helpers.
find_package(GTest REQUIRED)
include(GoogleTest)

# hz_gtest(NAME SOURCES... LINK TARGETS...): one executable, its tests discovered for ctest.
function(hz_gtest name)
  cmake_parse_arguments(PARSE_ARGV 1 arg "" "" "SOURCES;LINK")
  add_executable(${name} ${arg_SOURCES})
  hz_target(${name})
  target_link_libraries(${name} PRIVATE ${arg_LINK} GTest::gtest_main GTest::gmock)
  target_compile_definitions(${name} PRIVATE HZ_TEST_DIR="${PROJECT_SOURCE_DIR}/tests")
  gtest_discover_tests(${name} DISCOVERY_TIMEOUT 60 PROPERTIES TIMEOUT 300)
endfunction()
