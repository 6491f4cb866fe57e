# Makes a C++ source that holds a text file, so that the program needs no file at run time.
#   hz_embed(TARGET FILE SYMBOL)  defines  extern const std::string_view hz::embedded::SYMBOL
function(hz_embed target file symbol)
  set(source "${CMAKE_CURRENT_BINARY_DIR}/embedded_${symbol}.cpp")
  add_custom_command(
    OUTPUT "${source}"
    COMMAND "${CMAKE_COMMAND}" -DIN=${file} -DOUT=${source} -DSYMBOL=${symbol} -P "${PROJECT_SOURCE_DIR}/cmake/HzEmbedFile.cmake"
    DEPENDS "${file}" "${PROJECT_SOURCE_DIR}/cmake/HzEmbedFile.cmake"
    COMMENT "Embedding ${symbol}"
    VERBATIM)
  target_sources(${target} PRIVATE "${source}")
endfunction()
