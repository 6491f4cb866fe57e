#include "resolver.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "hz/distance.hpp"
#include "hz/extinction.hpp"
#include "hz/require.hpp"
#include "stated_fields.hpp"

namespace hz {
namespace {

constexpr double ln10 = 2.302585092994045684;
constexpr double evolved_log_g = 4.0;

/// What the settings want to try first.
std::string_view preferred_family(Quantity quantity, const Settings& settings) {
  switch (quantity) {
    case Quantity::luminosity:
      if (settings.luminosity_from == LuminosityFrom::radius) return "radius";
      return settings.luminosity_from == LuminosityFrom::photometry ? "photometry" : "stated";
    case Quantity::semi_major_axis:
      return settings.semi_major_axis_from == SemiMajorAxisFrom::stated ? "stated" : "period";
    case Quantity::insolation: return settings.insolation_from == InsolationFrom::stated ? "stated" : "computed";
    default: return {};
  }
}

/// The first that leads there, of those in the family or of the others.
std::optional<Form> walk(Resolver& resolver, Quantity quantity, std::string_view family, bool in_family) {
  for (const RouteEntry& entry : route_entries()) {
    if (entry.gives != quantity || entry.way == nullptr || (entry.family == family) != in_family) continue;
    std::optional<Form> found = entry.way(resolver);
    if (found || resolver.problem()) return found;
  }
  return std::nullopt;
}

std::optional<SpectralType> type_of(const StarRecord& star) {
  if (star.spectral_type.empty()) return std::nullopt;
  const Result<SpectralType> read = read_spectral_type(star.spectral_type);
  return read ? std::optional(*read) : std::nullopt;
}

/// What a relation makes of an error of its x: the slope between its ends, and half of how much farther y lies above
/// its centre at the upper end than the slope says. Tables have kinks, and types and masses reach over several of them.
struct Chord {
  double slope = 0;
  double skew = 0;
};

Chord chord_of(const Relation& y, double x, const HalfWidths& sides) {
  if (!(sides.minus + sides.plus > 0)) return {y.slope(x), 0};
  const double down = y(x) - y(x - sides.minus);
  const double up = y(x + sides.plus) - y(x);
  const double slope = (down + up) / (sides.minus + sides.plus);
  return {slope, ((up - slope * sides.plus) - (down - slope * sides.minus)) / 2};
}

/// Two magnitudes whose difference a colour is.
std::pair<Quantity, Quantity> magnitudes_of(Quantity color) {
  switch (color) {
    case Quantity::color_bv: return {Quantity::magnitude_b, Quantity::magnitude_v};
    case Quantity::color_vk: return {Quantity::magnitude_v, Quantity::magnitude_k};
    case Quantity::color_vj: return {Quantity::magnitude_v, Quantity::magnitude_j};
    default: return {Quantity::magnitude_bp, Quantity::magnitude_rp};
  }
}

}  // namespace

Resolver::Resolver(const ListRow& row, const Settings& settings, Flags& flags)
    : row_(row), settings_(settings), flags_(flags), inputs_(settings, flags), type_(type_of(row.star)) {}

std::optional<Form> Resolver::find(Quantity quantity) {
  if (problem_ || !busy_.insert(quantity).second) return std::nullopt;
  const std::string_view first = preferred_family(quantity, settings_);
  std::optional<Form> found = walk(*this, quantity, first, true);
  if (!found && !problem_) found = walk(*this, quantity, first, false);
  busy_.erase(quantity);
  return problem_ ? std::nullopt : found;
}

/// A stated Teff keeps the distribution it was stated with; a derived one has that of its first-order half-widths.
TeffInput Resolver::input_of(const Form& teff) const {
  if (teff.route == "stated") {
    const Input& stated = sources_[teff.terms.front().source].input;
    return {teff, stated.x, stated.used};
  }
  TeffInput input{teff, Distribution::exact(teff.value), plain(teff, sources_)};
  const HalfWidths sides = skewed_half_widths(teff, sources_);
  if (sides.minus + sides.plus > 0) {
    input.x =
        Distribution::two_piece(teff.value, sides.minus, sides.plus, settings_.asymmetry, domain_of(Quantity::teff));
  }
  return input;
}

const TeffInput* Resolver::teff() {
  if (!teff_sought_) {
    const std::optional<Form> form = find(Quantity::teff);
    if (form) teff_ = input_of(*form);
    teff_sought_ = !quiet_;  // a quiet look does not settle what the row says
  }
  return teff_ ? &*teff_ : nullptr;
}

void Resolver::raise(const Form& form) {
  for (const FormTerm& term : form.terms) {
    const Source& source = sources_[term.source];
    if (source.scatter_of.empty()) inputs_.raise(source.quantity, source.input);
  }
  if (form.marks.main_sequence) flags_.raise(flag::main_sequence_assumed);
  if (form.marks.extinction_ignored && !is_nearby()) flags_.raise(flag::extinction_ignored);
  if (form.marks.distance_prior) flags_.raise(flag::distance_prior);
}

std::optional<Input> Resolver::take(Quantity quantity) {
  const Field* field = stated_field(row_, quantity);
  HZ_REQUIRE(field != nullptr);
  if (quiet_) return inputs_.peek(quantity, *field);
  const Result<std::optional<Input>> taken = inputs_.take(quantity, *field);
  if (taken) return *taken;
  problem_ = taken.error();
  return std::nullopt;
}

std::optional<Form> Resolver::log_of(Quantity quantity) {
  const std::optional<Input> input = take(quantity);
  if (!input) return std::nullopt;
  return Form{std::log(input->used.value), {{sources_.of(quantity, *input, true), 1}}, {}, {}, "stated"};
}

std::optional<Form> Resolver::log_of_decadic(Quantity quantity) {
  std::optional<Form> form = stated(quantity);
  if (form) form = ln10 * *form;
  return form;
}

std::optional<Form> Resolver::stated(Quantity quantity) {
  const std::optional<Input> input = take(quantity);
  if (!input) return std::nullopt;
  return Form{input->used.value, {{sources_.of(quantity, *input, false), 1}}, {}, {}, "stated"};
}

Form Resolver::without_extinction(Form form, double ratio) {
  constexpr double visual_over_excess = 3.1;  // R_V, common practice
  if (const auto extinction = stated(Quantity::extinction_v)) return form - ratio * *extinction;
  if (const auto excess = stated(Quantity::reddening_bv)) return form - ratio * visual_over_excess * *excess;
  form.marks.extinction_ignored = true;
  return form;
}

std::optional<Form> Resolver::magnitude(Quantity quantity) {
  const std::optional<Form> form = stated(quantity);
  return form ? std::optional(without_extinction(*form, extinction_ratio(quantity))) : std::nullopt;
}

std::optional<Form> Resolver::color(Quantity quantity) {
  const auto [blue, red] = magnitudes_of(quantity);
  const std::optional<Form> first = stated(blue);
  const std::optional<Form> second = stated(red);
  std::optional<Form> form;
  if (first && second) {
    form = *first - *second;
    form->route = fmt::format("{} and {}", name(blue), name(red));
  } else if ((form = stated(quantity))) {
    form->route = name(quantity);
  }
  return form ? std::optional(without_extinction(*form, color_excess_ratio(quantity))) : std::nullopt;
}

std::optional<Form> Resolver::absolute_k() {
  const std::optional<Form> apparent = magnitude(Quantity::magnitude_k);
  if (!apparent) return std::nullopt;
  const std::optional<Form> distance = find(Quantity::distance);
  if (!distance) return std::nullopt;
  Form absolute = (*apparent - 5 / ln10 * *distance) + 5.0;
  absolute.route = fmt::format("magnitude_k and {}", distance_word(*distance));
  return absolute;
}

std::optional<Form> Resolver::subtype() {
  if (!type_ || !type_->subtype) return std::nullopt;
  Input input;
  input.used = {*type_->subtype, type_->half_width, type_->half_width, LimitMark::none, false};
  input.x = Distribution::two_piece(*type_->subtype, type_->half_width, type_->half_width, Asymmetry::median,
                                    domain_of(Quantity::log_g));
  return Form{*type_->subtype, {{sources_.of(Quantity::spectral_type, input, false), 1}}, {}, {}, "spectral_type"};
}

std::string Resolver::off_main_sequence() const {
  const std::string& text = row_.star.spectral_type;
  if (type_ && type_->kind != StarKind::dwarf) {
    return fmt::format("{} ({}), for which relations of main-sequence stars do not hold", word(type_->kind), text);
  }
  const std::optional<Measured>& log_g = row_.star.log_g.stated;
  if (log_g && log_g->limit == LimitMark::none && log_g->value < evolved_log_g) {
    return fmt::format("off the main sequence (log g {:.2f}), and relations that could help hold on it alone",
                       log_g->value);
  }
  return {};
}

bool Resolver::holds(const Relation& relation) const {
  if (type_ && type_->kind == StarKind::white_dwarf) return false;
  return !relation.main_sequence || off_main_sequence().empty();
}

std::optional<Form> Resolver::apply(std::string_view key, const std::optional<Form>& x, Quantity quantity) {
  if (!x) return std::nullopt;
  const Relation& known = relation(key);
  if (!known.range().contains(x->value) || !holds(known)) return std::nullopt;
  const TeffInput* const followed = x->curve.is_flat() ? nullptr : teff();
  const Chord chord = chord_of(known, x->value, half_widths(*x, followed ? &followed->form : nullptr, sources_));
  Form y = chord.slope * *x;
  y.value = known(x->value);
  y.terms.push_back({sources_.scatter(quantity, known, known.scatter(x->value), chord.skew), 1});
  y.marks.main_sequence = y.marks.main_sequence || known.main_sequence;
  y.route = fmt::format("{} by {}", x->route, known.label);
  return y;
}

bool Resolver::is_nearby() {
  constexpr double local_bubble = 100;  // pc
  const Quiet quiet(*this);
  const std::optional<Form> distance = find(Quantity::distance);
  return distance && distance->value < std::log(local_bubble);
}

std::string_view Resolver::distance_word(const Form& distance) {
  return distance.route == "stated" ? "distance" : "parallax";
}

}  // namespace hz
