#include "flag_text.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "hz/require.hpp"

namespace hz::app {

std::string flag_sentence(std::string_view flag) {
  const auto matches = [&](const FlagInfo& info) {
    return info.word.ends_with(':') ? flag.starts_with(info.word) : flag == info.word;
  };
  const auto infos = all_flags();
  const auto found = std::find_if(infos.begin(), infos.end(), matches);
  HZ_REQUIRE(found != infos.end());
  return fmt::format("{}: {}.", flag, found->meaning);
}

std::string flag_word(const FlagInfo& flag) {
  return std::string(flag.word) + (flag.word.ends_with(':') ? "QUANTITY" : "");
}

}  // namespace hz::app
