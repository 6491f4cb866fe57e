// The options that decide how a row is answered, shared by every command that answers one.
#pragma once
#include <memory>
#include <span>

#include "hz/limit_set.hpp"
#include "hz/settings.hpp"
#include "options.hpp"

namespace hz::app {

/// Which limits, and what uncertain or missing numbers stand for: all that boundaries depend on.
[[nodiscard]] std::span<const Option> boundary_options();

/// What a placement depends on besides.
[[nodiscard]] std::span<const Option> placement_options();

/// The settings of a run with the limits they point into.
struct Choices {
  std::shared_ptr<const LimitCatalog> catalog;
  Settings settings;
};

/// Published limits with the user's own (--limits), whether or not a run answers anything.
[[nodiscard]] std::shared_ptr<const LimitCatalog> read_catalog(const Arguments& arguments);

/// The set of this key. Throws hz::Error (usage) that offers the closest key.
[[nodiscard]] const LimitSet& limit_set_named(const LimitCatalog& catalog, const std::string& key);

/// Settings from the options; options the command does not have keep their defaults.
/// Throws hz::Error: usage for a value that makes no sense, input for a bad --limits file.
[[nodiscard]] Choices read_choices(const Arguments& arguments);

/// The parts of read_choices that read a whole phrase; for tests.
[[nodiscard]] AssumedErrors read_assumed_errors(const std::string& text);
[[nodiscard]] VerdictThresholds read_thresholds(const std::string& text);

}  // namespace hz::app
