# Writes OUTPUT, the C++ source of harness/report/page_parts.h: the files of
# SOURCE as string literals, and what a content security policy knows them by.
#
#   cmake -DSOURCE=reports -DOUTPUT=page_parts.cc -P EmbedPage.cmake
file(WRITE ${OUTPUT} "// Made by cmake/EmbedPage.cmake.\n\n"
  "#include \"harness/report/page_parts.h\"\n\n"
  "#ifdef __clang__\n"
  "#pragma clang diagnostic ignored \"-Woverlength-strings\"\n#endif\n\n"
  "namespace gatedyno {\n")
foreach(part IN ITEMS
    kPageShell=page.html kPageStyle=page.css kPageScript=page.js
    kChartScript=vendor/charts.min.js kChartLicences=vendor/LICENSES.txt)
  string(REGEX MATCH "^(.*)=(.*)$" unused ${part})
  set(name ${CMAKE_MATCH_1})
  file(READ ${SOURCE}/${CMAKE_MATCH_2} text)
  file(SHA256 ${SOURCE}/${CMAKE_MATCH_2} hash)
  file(APPEND ${OUTPUT}
    "\nconst PagePart ${name} = {\n    R\"embedded(" "${text}"
    ")embedded\",\n    \"${hash}\"};\n")
endforeach()
file(APPEND ${OUTPUT} "\n}  // namespace gatedyno\n")
