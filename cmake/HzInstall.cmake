# What `cmake --install` puts under a prefix besides what apps/ (program, manual page) and plots/ (typefaces) install
# themselves: the libraries with their headers, the CMake package, data, licence. Included when all targets exist.
# A library that only compiles into ours (header-only) is linked as $<BUILD_INTERFACE:...>, so that a program that uses hz
# need not have it.
include(CMakePackageConfigHelpers)
set(hz_package_dir "${CMAKE_INSTALL_LIBDIR}/cmake/hz")

# hz_install_library(TARGET EXPORT): the library and its entry in the CMake package.
function(hz_install_library target export)
  install(TARGETS ${target} EXPORT ${export}
    ARCHIVE DESTINATION "${CMAKE_INSTALL_LIBDIR}"
    LIBRARY DESTINATION "${CMAKE_INSTALL_LIBDIR}")
  install(EXPORT ${export} NAMESPACE hz:: DESTINATION "${hz_package_dir}")
endfunction()

hz_install_library(hz hzTargets)
install(DIRECTORY libhz/include/hz DESTINATION "${CMAKE_INSTALL_INCLUDEDIR}")
if(TARGET hz_plots)
  hz_install_library(hz_plots hzPlotsTargets)
  install(DIRECTORY plots/include/ DESTINATION "${CMAKE_INSTALL_INCLUDEDIR}")
endif()

configure_package_config_file(cmake/hzConfig.cmake.in hzConfig.cmake INSTALL_DESTINATION "${hz_package_dir}")
write_basic_package_version_file(hzConfigVersion.cmake COMPATIBILITY SameMinorVersion)
install(FILES "${PROJECT_BINARY_DIR}/hzConfig.cmake" "${PROJECT_BINARY_DIR}/hzConfigVersion.cmake"
  DESTINATION "${hz_package_dir}")
install(DIRECTORY catalogs/ DESTINATION "${CMAKE_INSTALL_DATADIR}/hzmap")
install(FILES LICENSE README.md DESTINATION "${CMAKE_INSTALL_DOCDIR}")

# All that is installed and nothing else, for those who do not build the tests.
add_custom_target(installed)
foreach(target hz hz_plots hzmap man_page)
  if(TARGET ${target})
    add_dependencies(installed ${target})
  endif()
endforeach()
