#include "png_chunks.hpp"

#include <zlib.h>

#include <algorithm>
#include <cmath>
#include <cstdint>

#include "hz/require.hpp"

namespace hz::plots {
namespace {

// PNG, third edition, W3C: signature 8 bytes, then IHDR: length 4, type 4, data 13, CRC 4.
constexpr std::size_t header_end = 8 + 4 + 4 + 13 + 4;

std::string big_endian(std::uint32_t number) {
  std::string bytes;
  for (const int shift : {24, 16, 8, 0}) bytes += static_cast<char>(number >> shift & 0xffU);
  return bytes;
}

std::string chunk(const std::string& type, const std::string& data) {
  const std::string body = type + data;
  const uLong crc = crc32(0, reinterpret_cast<const Bytef*>(body.data()), static_cast<uInt>(body.size()));
  return big_endian(static_cast<std::uint32_t>(data.size())) + body + big_endian(static_cast<std::uint32_t>(crc));
}

std::string resolution(double dpi) {
  const std::string per_meter = big_endian(static_cast<std::uint32_t>(std::lround(dpi / 0.0254)));
  return chunk("pHYs", per_meter + per_meter + '\1');
}

std::string title_chunk(const std::string& title) {
  const std::string keyword = std::string("Title") + '\0';
  const bool ascii = std::all_of(title.begin(), title.end(), [](char c) { return c >= ' ' && c <= '~'; });
  if (ascii) return chunk("tEXt", keyword + title);
  const std::string not_compressed_no_language(4, '\0');
  return chunk("iTXt", keyword + not_compressed_no_language + title);
}

}  // namespace

std::string finished_png(const std::string& png, double dpi, const std::string& title) {
  HZ_REQUIRE(png.size() > header_end);
  std::string chunks = resolution(dpi);
  if (!title.empty()) chunks += title_chunk(title);
  return png.substr(0, header_end) + chunks + png.substr(header_end);
}

}  // namespace hz::plots
