// hzmap routes: the ways to every quantity, in the order in which they are tried.
#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "aligned_table.hpp"
#include "closest.hpp"
#include "commands.hpp"
#include "hz/error.hpp"
#include "hz/extinction.hpp"
#include "hz/relation.hpp"
#include "hz/routes.hpp"
#include "numbers.hpp"
#include "text_layout.hpp"

namespace hz::app {
namespace {

std::string with_unit(const std::string& text, const std::string& unit) {
  return unit.empty() ? text : text + " " + unit;
}

std::string range_text(const Relation& relation) {
  return with_unit(fmt::format("{} to {}", short_number(rounded(relation.range().low, 4)),
                               short_number(rounded(relation.range().high, 4))),
                   relation.x_unit);
}

/// "Boyajian et al. 2013".
std::string authors_of(const Relation& relation) { return relation.citation.substr(0, relation.citation.find(',')); }

/// The scatter, or from where to where it runs over the range.
std::string scatter_text(const Relation& relation) {
  constexpr int steps = 50;
  const Range& range = relation.range();
  double least = relation.scatter(range.low);
  double most = least;
  for (int i = 1; i <= steps; ++i) {
    const double scatter = relation.scatter(range.low + (range.high - range.low) * i / steps);
    least = std::min(least, scatter);
    most = std::max(most, scatter);
  }
  const std::string low = short_number(rounded(least, 2));
  const std::string high = short_number(rounded(most, 2));
  return with_unit(low == high ? low : fmt::format("{} to {}", low, high), relation.y_unit);
}

/// The quantities that have routes, in the table's order.
std::vector<Quantity> quantities() {
  std::vector<Quantity> all;
  for (const RouteInfo& route : all_routes()) {
    if (all.empty() || all.back() != route.gives) all.push_back(route.gives);
  }
  return all;
}

void add_lines(AlignedTable& table, const RouteInfo& route, std::size_t place) {
  const std::string number = fmt::format("{}", place);
  if (route.relations.empty()) {
    table.add({number, std::string(route.needs), std::string(route.law), "", "", std::string(route.holds)});
    return;
  }
  bool first = true;
  for (const std::string_view key : route.relations) {
    const Relation& known = relation(key);
    table.add({first ? number : "", first ? std::string(route.needs) : "or",
               known.label + ", " + authors_of(known) + (route.law.empty() ? "" : "; " + std::string(route.law)),
               range_text(known), scatter_text(known), first ? std::string(route.holds) : ""});
    first = false;
  }
}

std::string in_brief(Quantity quantity, const Console& console) {
  AlignedTable table({{"", Align::right}, {"from"}, {"by"}, {"range"}, {"scatter"}, {"when"}}, "");
  std::size_t place = 0;
  for (const RouteInfo& route : all_routes()) {
    if (route.gives == quantity) add_lines(table, route, ++place);
  }
  const QuantityInfo& about = info(quantity);
  return console.styled(about.name, Style::strong) + ": " + about.description + "\n" + table.text(console, 2);
}

/// Sources, provenance and warnings of the relations that lead to a quantity.
std::string sources_of(Quantity quantity, std::size_t width) {
  std::string text;
  for (const RouteInfo& route : all_routes()) {
    if (route.gives != quantity) continue;
    for (const std::string_view key : route.relations) {
      const Relation& known = relation(key);
      std::string about = fmt::format("{} ({}): {}, doi:{}. Scatter: {}. Digits: {}", known.label, known.key,
                                      known.citation, known.doi, known.scatter_source, known.provenance);
      if (known.main_sequence) about += " For main-sequence stars.";
      if (!known.warning.empty()) about += " Warning: " + known.warning;
      text += wrapped(about, width) + "\n";
    }
  }
  return text;
}

std::string extinction_sentence() {
  return fmt::format(
      "Extinction is taken off magnitudes and colours where it is stated, as A_V or as E(B-V) with R_V = 3.1: "
      "A_G = {} A_V, A_J = {} A_V, A_Ks = {} A_V, E(BP-RP) = {} A_V.",
      extinction_ratio(Quantity::magnitude_g), extinction_ratio(Quantity::magnitude_j),
      extinction_ratio(Quantity::magnitude_k), color_excess_ratio(Quantity::color_bp_rp));
}

Quantity asked_for(const std::string& word) {
  std::vector<std::string> names;
  for (const Quantity quantity : quantities()) {
    if (name(quantity) == word) return quantity;
    names.emplace_back(name(quantity));
  }
  throw Error(Fault::usage,
              fmt::format("no route leads to `{}`{} (`hzmap routes` lists them)", word, did_you_mean(word, names)));
}

}  // namespace

int run_routes(const Arguments& arguments, Console& console) {
  const std::size_t width = terminal_width();
  if (!arguments.words().empty()) {
    const Quantity quantity = asked_for(arguments.words().front());
    const std::string sources = sources_of(quantity, width);
    console.print(in_brief(quantity, console) + (sources.empty() ? "" : "\n" + sources));
    return exit_code::done;
  }
  for (const Quantity quantity : quantities()) console.print(in_brief(quantity, console) + "\n");
  console.print(wrapped(extinction_sentence(), width) + "\n");
  console.print(
      wrapped("The first that leads anywhere is taken; what each owes to its inputs and to the scatter of its "
              "relation goes into every answer. `hzmap routes QUANTITY` shows the sources.",
              width) +
      "\n");
  return exit_code::done;
}

}  // namespace hz::app
