#include "svg_finish.hpp"

#include <fmt/format.h>

#include <cstdint>
#include <string_view>

namespace hz::plots {
namespace {

/// FNV-1a, 64 bit (Fowler, Noll, Vo): the same figure gets the same prefix on every run.
std::uint64_t fingerprint(std::string_view bytes) {
  std::uint64_t hash = 14695981039346656037U;
  for (const char byte : bytes) hash = (hash ^ static_cast<unsigned char>(byte)) * 1099511628211U;
  return hash;
}

std::string escaped(std::string_view text) {
  std::string out;
  for (const char c : text) {
    if (c == '&')
      out += "&amp;";
    else if (c == '<')
      out += "&lt;";
    else if (c == '>')
      out += "&gt;";
    else if (c == '"')
      out += "&quot;";
    else if (static_cast<unsigned char>(c) < 0x20)
      out += ' ';
    else
      out += c;
  }
  return out;
}

void replace_all(std::string& text, std::string_view from, const std::string& to) {
  for (std::size_t at = text.find(from); at != text.npos; at = text.find(from, at + to.size()))
    text.replace(at, from.size(), to);
}

/// Cairo numbers its surfaces through the life of a program; a figure must not depend on what was drawn before it.
void renumber_surfaces(std::string& svg) {
  constexpr std::string_view start = " id=\"surface";
  for (std::size_t at = svg.find(start); at != svg.npos; at = svg.find(start, at + 1)) {
    const std::size_t digits = at + start.size();
    svg.erase(digits, svg.find('"', digits) - digits);
  }
}

}  // namespace

std::string finished_svg(const std::string& svg, const std::string& title, const std::string& description) {
  std::string out = svg;
  renumber_surfaces(out);
  const std::string prefix = fmt::format("hz{:016x}-", fingerprint(out + title + description));
  replace_all(out, " id=\"", " id=\"" + prefix);
  replace_all(out, "href=\"#", "href=\"#" + prefix);
  replace_all(out, "url(#", "url(#" + prefix);

  const std::size_t open = out.find("<svg ");
  const std::size_t inside = out.find('>', open) + 1;
  out.insert(inside, fmt::format("\n<title id=\"{0}title\">{1}</title>\n<desc id=\"{0}desc\">{2}</desc>", prefix,
                                 escaped(title), escaped(description)));
  out.insert(open + 5, fmt::format("role=\"img\" aria-labelledby=\"{0}title {0}desc\" ", prefix));
  return out;
}

}  // namespace hz::plots
