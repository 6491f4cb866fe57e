#include "limit_file.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <utility>

#include "limit_check.hpp"
#include "toml_table.hpp"

namespace hz {
namespace {

bool is_key_character(char c) {
  return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z') || (c >= '0' && c <= '9') || c == '_' || c == '-';
}

/// A key goes on a command line and into file columns, so it is one plain word.
std::string read_key(const TomlTable& table) {
  std::string key = table.text("key");
  if (!std::all_of(key.begin(), key.end(), is_key_character)) {
    table.fail("key",
               fmt::format("key '{}' holds other characters than letters, digits, - and _; leave them out", key));
  }
  return key;
}

double read_positive(const TomlTable& table, std::string_view key) {
  const double value = table.number(key);
  if (value <= 0) table.fail(key, fmt::format("{}: '{}' is {:g}; it must be above 0", table.name(), key, value));
  return value;
}

LimitForm read_quartic(const TomlTable& limit, const std::string& file) {
  limit.allow_only({"key", "title", "form", "teff_reference", "rows"});
  QuarticForm form{limit.number("teff_reference"), {}};
  for (const toml::node& node : limit.tables("rows")) {
    const TomlTable row(node, file, fmt::format("a row of {}", limit.name()));
    row.allow_only({"planet_mass", "s0", "a", "b", "c", "d"});
    const double planet_mass = read_positive(row, "planet_mass");
    if (!form.rows.empty() && planet_mass <= form.rows.back().planet_mass) {
      row.fail("planet_mass", fmt::format("{}: planet_mass {:g} follows {:g}; order the rows by rising planet mass",
                                          limit.name(), planet_mass, form.rows.back().planet_mass));
    }
    form.rows.push_back(
        {planet_mass, {row.number("s0"), row.number("a"), row.number("b"), row.number("c"), row.number("d")}});
  }
  return form;
}

LimitForm read_distance_quadratic(const TomlTable& limit) {
  limit.allow_only({"key", "title", "form", "teff_reference", "l_sun", "a", "b"});
  return DistanceQuadraticForm{limit.number("l_sun"), limit.number("a"), limit.number("b"),
                               limit.number("teff_reference")};
}

LimitForm read_flux_quadratic(const TomlTable& limit) {
  limit.allow_only({"key", "title", "form", "t2", "t1", "t0"});
  return FluxQuadraticForm{limit.number("t2"), limit.number("t1"), limit.number("t0")};
}

LimitForm read_flux_point(const TomlTable& limit) {
  limit.allow_only({"key", "title", "form", "insolation"});
  return FluxPointForm{read_positive(limit, "insolation")};
}

LimitForm read_distance_point(const TomlTable& limit) {
  limit.allow_only({"key", "title", "form", "distance"});
  return DistancePointForm{read_positive(limit, "distance")};
}

LimitForm read_equilibrium(const TomlTable& limit) {
  limit.allow_only({"key", "title", "form", "temperature", "bond_albedo"});
  const EquilibriumForm form{read_positive(limit, "temperature"), limit.number("bond_albedo")};
  if (form.bond_albedo < 0 || form.bond_albedo >= 1) {
    limit.fail("bond_albedo", fmt::format("{}: 'bond_albedo' is {:g}; it must be at least 0 and below 1", limit.name(),
                                          form.bond_albedo));
  }
  return form;
}

LimitForm read_form(const TomlTable& limit, const std::string& file) {
  const std::string form = limit.text("form");
  if (form == "flux_quartic") return read_quartic(limit, file);
  if (form == "distance_quadratic") return read_distance_quadratic(limit);
  if (form == "flux_quadratic") return read_flux_quadratic(limit);
  if (form == "flux_point") return read_flux_point(limit);
  if (form == "distance_point") return read_distance_point(limit);
  if (form == "equilibrium_temperature") return read_equilibrium(limit);
  limit.fail("form", fmt::format("{}: unknown form '{}'; known: flux_quartic, distance_quadratic, flux_quadratic, "
                                 "flux_point, distance_point, equilibrium_temperature",
                                 limit.name(), form));
}

std::string with_blanks(std::string key) {
  std::replace(key.begin(), key.end(), '_', ' ');
  return key;
}

std::optional<std::size_t> index_of(const std::vector<FluxLimit>& limits, std::string_view key) {
  const auto named = [key](const FluxLimit& limit) { return same_key(limit.key(), key); };
  const auto found = std::find_if(limits.begin(), limits.end(), named);
  if (found == limits.end()) return std::nullopt;
  return static_cast<std::size_t>(found - limits.begin());
}

/// Reads one [[set]].
class SetReader {
public:
  SetReader(const toml::node& node, const std::string& file, const std::vector<LimitSet>& known)
      : file_(file), known_(known), table_(node, file, "a [[set]]") {
    if (table_.has("key")) table_ = TomlTable(node, file, fmt::format("set '{}'", read_key(table_)));
  }

  [[nodiscard]] LimitSet read() {
    table_.allow_only({"key", "title", "citation", "doi", "status", "provenance", "warning", "teff_range",
                       "conservative", "optimistic", "limit"});
    read_words();
    read_limits();
    set_.conservative = read_zone("conservative");
    set_.optimistic = read_zone("optimistic");
    if (const Trouble trouble = trouble_of_nesting(set_)) table_.fail("conservative", in_set(*trouble));
    return std::move(set_);
  }

private:
  [[nodiscard]] std::string in_set(const std::string& what) const { return fmt::format("{}: {}", table_.name(), what); }

  void read_words() {
    set_.key = read_key(table_);
    const auto taken = [this](const LimitSet& set) { return same_key(set.key, set_.key); };
    if (std::any_of(known_.begin(), known_.end(), taken)) {
      table_.fail("key", fmt::format("there is a set '{}' already; choose another key", set_.key));
    }
    set_.title = table_.text("title");
    set_.citation = table_.text("citation");
    set_.doi = table_.text_or("doi", "");
    set_.provenance = table_.text_or("provenance", "");
    set_.warning = table_.text_or("warning", "");
    set_.status = table_.text_or("status", "current");
    if (set_.status != "current" && set_.status != "superseded") {
      table_.fail("status", in_set(fmt::format("status is '{}'; write \"current\" or \"superseded\"", set_.status)));
    }
  }

  [[nodiscard]] std::optional<Range> read_teff_range() const {
    if (!table_.has("teff_range")) return std::nullopt;
    const std::vector<double> ends = table_.numbers("teff_range");
    if (ends.size() != 2 || ends[0] <= 0 || ends[0] > ends[1]) {
      table_.fail("teff_range", in_set("'teff_range' is not two temperatures; write [lowest, highest] in K"));
    }
    return Range{ends[0], ends[1]};
  }

  void read_limits() {
    const std::optional<Range> teff_range = read_teff_range();
    for (const toml::node& node : table_.tables("limit")) set_.limits.push_back(read_limit(node, teff_range));
  }

  [[nodiscard]] FluxLimit read_limit(const toml::node& node, const std::optional<Range>& teff_range) const {
    TomlTable table(node, file_, fmt::format("a limit of set '{}'", set_.key));
    const std::string key = read_key(table);
    table = TomlTable(node, file_, fmt::format("limit '{}' of set '{}'", key, set_.key));
    if (index_of(set_.limits, key))
      table.fail("key", in_set(fmt::format("a second limit '{}'; choose another key", key)));
    LimitForm form = read_form(table, file_);
    if (!teff_range && !std::holds_alternative<EquilibriumForm>(form)) {
      table_.fail("teff_range", in_set("no 'teff_range', which every form but equilibrium_temperature needs; add it"));
    }
    FluxLimit limit(key, table.text_or("title", with_blanks(key)), teff_range, std::move(form));
    if (const Trouble trouble = trouble_of_limit(limit)) table.fail("form", in_set(*trouble));
    return limit;
  }

  [[nodiscard]] std::optional<Zone> read_zone(std::string_view name) const {
    if (!table_.has(name)) return std::nullopt;
    const std::vector<std::string> keys = table_.texts(name);
    if (keys.size() != 2) {
      table_.fail(name, in_set(fmt::format("'{}' names {} limits; write [inner, outer]", name, keys.size())));
    }
    const Zone zone{find_limit(name, keys[0]), find_limit(name, keys[1])};
    if (const Trouble trouble = trouble_of_zone(set_, zone)) table_.fail(name, in_set(*trouble));
    return zone;
  }

  [[nodiscard]] std::size_t find_limit(std::string_view zone, const std::string& key) const {
    const std::optional<std::size_t> index = index_of(set_.limits, key);
    if (index) return *index;
    std::vector<std::string_view> keys;
    for (const FluxLimit& limit : set_.limits) keys.push_back(limit.key());
    table_.fail(zone, in_set(fmt::format("'{}' names a limit '{}' that the set does not have; its limits: {}", zone,
                                         key, fmt::join(keys, ", "))));
  }

  const std::string& file_;
  const std::vector<LimitSet>& known_;
  TomlTable table_;
  LimitSet set_;
};

char lower(char c) { return c >= 'A' && c <= 'Z' ? static_cast<char>(c - 'A' + 'a') : c; }

}  // namespace

std::vector<LimitSet> read_limit_sets(std::string_view toml_text, const std::string& file,
                                      std::vector<LimitSet> known) {
  const toml::table root = parse_toml(toml_text, file);
  const TomlTable table(root, file, "the file");
  table.allow_only({"set"});
  for (const toml::node& node : table.tables("set")) known.push_back(SetReader(node, file, known).read());
  return known;
}

bool same_key(std::string_view a, std::string_view b) {
  return std::equal(a.begin(), a.end(), b.begin(), b.end(), [](char x, char y) { return lower(x) == lower(y); });
}

}  // namespace hz
