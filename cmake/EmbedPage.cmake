# Writes OUTPUT, the C++ source of harness/page/page_parts.h: the files of
# SOURCE as string literals, and what a content security policy knows them by.
#
#   cmake -DSOURCE=reports -DOUTPUT=page_parts.cc -P EmbedPage.cmake
file(WRITE ${OUTPUT} "// Made by cmake/EmbedPage.cmake.\n\n"
  "#include \"harness/page/page_parts.h\"\n\n"
  "#ifdef __clang__\n"
  "#pragma clang diagnostic ignored \"-Woverlength-strings\"\n#endif\n\n"
  "namespace gatedyno {\n")

function(embed name text)
  string(SHA256 hash "${text}")
  file(APPEND ${OUTPUT}
    "\nconst PagePart ${name} = {\n    R\"embedded(" "${text}"
    ")embedded\",\n    \"${hash}\"};\n")
endfunction()

function(embed_file name file)
  file(READ ${SOURCE}/${file} text)
  embed(${name} "${text}")
endfunction()

embed_file(kPageShell page.html)
embed_file(kVersusShell versus.html)
embed_file(kPageStyle page.css)
embed_file(kChartScript vendor/charts.min.js)
embed_file(kChartLicences vendor/LICENSES.txt)

# One script of all its parts, in a scope of its own.
function(embed_script name)
  set(script "(() => {\n")
  foreach(part IN LISTS ARGN)
    file(READ ${SOURCE}/script/${part}.js text)
    string(APPEND script "${text}")
  endforeach()
  embed(${name} "${script}})();\n")
endfunction()

embed_script(kPageScript common charts redraw differences pictures waves
  arc_table sort_filter main)
embed_script(kVersusScript common charts redraw versus_pairs sort_filter
  versus_changes versus_main)
file(APPEND ${OUTPUT} "\n}  // namespace gatedyno\n")
