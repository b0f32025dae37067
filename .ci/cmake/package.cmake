# Installing gives the program and, for find_package(swaymark), the targets swaymark::core, swaymark::modal and
# swaymark::spectrum.
include(CMakePackageConfigHelpers)

set(package_folder ${CMAKE_INSTALL_LIBDIR}/cmake/swaymark)

install(TARGETS swaymark_core swaymark_modal swaymark_spectrum EXPORT swaymark-targets
        ARCHIVE DESTINATION ${CMAKE_INSTALL_LIBDIR}
        FILE_SET HEADERS DESTINATION ${CMAKE_INSTALL_INCLUDEDIR}/swaymark)
install(EXPORT swaymark-targets NAMESPACE swaymark:: DESTINATION ${package_folder})
configure_package_config_file(.ci/cmake/swaymark-config.cmake.in ${PROJECT_BINARY_DIR}/swaymark-config.cmake
                              INSTALL_DESTINATION ${package_folder})
write_basic_package_version_file(${PROJECT_BINARY_DIR}/swaymark-config-version.cmake COMPATIBILITY SameMinorVersion)
install(FILES ${PROJECT_BINARY_DIR}/swaymark-config.cmake ${PROJECT_BINARY_DIR}/swaymark-config-version.cmake
        DESTINATION ${package_folder})

install(TARGETS swaymark RUNTIME DESTINATION ${CMAKE_INSTALL_BINDIR})
install(DIRECTORY data/ DESTINATION ${CMAKE_INSTALL_DATADIR}/swaymark
        PATTERN reference EXCLUDE PATTERN rejected EXCLUDE)
install(FILES LICENSE README.md DESTINATION ${CMAKE_INSTALL_DOCDIR})
