# What an installation has beside programs and data: the manual page, made of
# the command table by the program itself, and completion for three shells; and
# the Debian package: cpack -G DEB.
include_guard()

set(manual ${PROJECT_BINARY_DIR}/gatedyno.1.gz)
add_custom_command(OUTPUT ${manual}
  COMMAND gatedyno manual | gzip -9n > ${manual}
  DEPENDS gatedyno VERBATIM)
add_custom_target(manual ALL DEPENDS ${manual})
install(FILES ${manual} DESTINATION ${CMAKE_INSTALL_MANDIR}/man1)

set(shell ${PROJECT_SOURCE_DIR}/harness/cli/shell)
install(FILES ${shell}/gatedyno.bash RENAME gatedyno
        DESTINATION ${CMAKE_INSTALL_DATADIR}/bash-completion/completions)
install(FILES ${shell}/_gatedyno
        DESTINATION ${CMAKE_INSTALL_DATADIR}/zsh/vendor-completions)
install(FILES ${shell}/gatedyno.fish
        DESTINATION ${CMAKE_INSTALL_DATADIR}/fish/vendor_completions.d)
install(FILES ${PROJECT_SOURCE_DIR}/cmake/copyright
        DESTINATION ${CMAKE_INSTALL_DOCDIR})
install(FILES ${PROJECT_SOURCE_DIR}/README.md
              ${PROJECT_SOURCE_DIR}/reports/vendor/LICENSES.txt
        DESTINATION ${CMAKE_INSTALL_DOCDIR})

# What the JSON that gatedyno writes holds; those of what it reads are beside
# its nodes and plans.
install(DIRECTORY ${PROJECT_SOURCE_DIR}/reports/
        DESTINATION ${CMAKE_INSTALL_DATADIR}/gatedyno/reports
        FILES_MATCHING PATTERN "*.schema.json"
        PATTERN vendor EXCLUDE PATTERN script EXCLUDE)

set(CPACK_GENERATOR DEB)
set(CPACK_PACKAGE_NAME gatedyno)
set(CPACK_PACKAGE_CONTACT "the gatedyno team <gatedyno@localhost>")
set(CPACK_PACKAGE_DESCRIPTION_SUMMARY
    "checks hand effort estimates of CMOS cells against simulation")
set(CPACK_DEBIAN_PACKAGE_DESCRIPTION
"gatedyno reads a cell's transistor netlist, derives logical effort and
parasitic delay of each input and edge, measures both with an embedded
circuit simulator, and says where they differ by more than is allowed.")
set(CPACK_DEBIAN_PACKAGE_SECTION electronics)
set(CPACK_DEBIAN_PACKAGE_SHLIBDEPS ON)  # Its libraries, by dpkg-shlibdeps.
set(CPACK_DEBIAN_FILE_NAME DEB-DEFAULT)
set(CPACK_STRIP_FILES ON)
set(CPACK_PACKAGING_INSTALL_PREFIX /usr)
include(CPack)
