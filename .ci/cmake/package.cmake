# Installing gives find_package(swaymark) with the targets swaymark::core, swaymark::modal and swaymark::spectrum,
# and the program.
include(CMakePackageConfigHelpers)

install(TARGETS swaymark_core swaymark_modal swaymark_spectrum EXPORT swaymark-targets
        ARCHIVE DESTINATION ${CMAKE_INSTALL_LIBDIR}
        FILE_SET HEADERS DESTINATION ${CMAKE_INSTALL_INCLUDEDIR}/swaymark)
install(TARGETS swaymark RUNTIME DESTINATION ${CMAKE_INSTALL_BINDIR})
install(DIRECTORY data/ DESTINATION ${CMAKE_INSTALL_DATADIR}/swaymark PATTERN reference EXCLUDE PATTERN rejected EXCLUDE)
install(FILES LICENSE README.md DESTINATION ${CMAKE_INSTALL_DOCDIR})
