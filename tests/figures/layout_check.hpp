// What may never happen on a page.
#pragma once
#include <string>
#include <vector>

#include "hz/plots/scene.hpp"

namespace hz::plots::testing {

/// Sentences about words that overlap words, discs or leaders, about planets that cover each other, marks that leave
/// the page, words under 7 pt and lines under 0.5 pt; empty when all is well.
std::vector<std::string> layout_faults(const Scene& scene);

/// The shapes of one kind whose tag begins so.
template <class Kind>
std::vector<Kind> shapes(const Scene& scene, const std::string& tag) {
  std::vector<Kind> found;
  for (const Mark& mark : scene.marks)
    if (mark.tag.rfind(tag, 0) == 0)
      if (const Kind* shape = std::get_if<Kind>(&mark.shape)) found.push_back(*shape);
  return found;
}

/// All words of a scene, by blanks.
std::string words(const Scene& scene);

}  // namespace hz::plots::testing
