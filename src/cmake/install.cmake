# What is installed: the program, the library with its headers, and the package files by which another
# project finds it: find_package(rainledger), target rainledger::rainledger.
include(CMakePackageConfigHelpers)

set(package_folder ${CMAKE_INSTALL_LIBDIR}/cmake/rainledger)

install(TARGETS rainledger_program RUNTIME DESTINATION ${CMAKE_INSTALL_BINDIR})
install(TARGETS rainledger EXPORT rainledger_targets ARCHIVE DESTINATION ${CMAKE_INSTALL_LIBDIR})
install(DIRECTORY ${PROJECT_SOURCE_DIR}/include/rainledger DESTINATION ${CMAKE_INSTALL_INCLUDEDIR}
        FILES_MATCHING PATTERN "*.hpp")
install(EXPORT rainledger_targets FILE rainledger-targets.cmake NAMESPACE rainledger:: DESTINATION ${package_folder})
configure_package_config_file(
  ${PROJECT_SOURCE_DIR}/src/cmake/rainledger-config.cmake.in
  ${CMAKE_CURRENT_BINARY_DIR}/rainledger-config.cmake
  INSTALL_DESTINATION ${package_folder})
write_basic_package_version_file(
  ${CMAKE_CURRENT_BINARY_DIR}/rainledger-config-version.cmake COMPATIBILITY SameMinorVersion)
install(FILES
  ${CMAKE_CURRENT_BINARY_DIR}/rainledger-config.cmake
  ${CMAKE_CURRENT_BINARY_DIR}/rainledger-config-version.cmake
  DESTINATION ${package_folder})
