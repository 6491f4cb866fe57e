# Run by hz_embed: IN, OUT, SYMBOL.
file(READ "${IN}" hex HEX)
string(REGEX REPLACE "([0-9a-f][0-9a-f])" "'\\\\x\\1'," bytes "${hex}")
string(REGEX REPLACE "((....... ?){24})" "\\1\n" bytes "${bytes}")
file(WRITE "${OUT}"
"#include <string_view>
namespace hz::embedded {
namespace {
const char bytes[] = {${bytes}'\\0'};
}
extern const std::string_view ${SYMBOL};
const std::string_view ${SYMBOL}(bytes, sizeof bytes - 1);
}
")
