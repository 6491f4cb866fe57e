// From what a row states to what follows from it: walks the table of routes and carries every raw input along.
#pragma once
#include <optional>
#include <set>
#include <string>
#include <string_view>

#include "hz/answer.hpp"
#include "hz/spectral_type.hpp"
#include "route_table.hpp"
#include "sources.hpp"

namespace hz {

/// Teff as it enters a placement.
struct TeffInput {
  Form form;  // K
  Distribution x = Distribution::exact(0);
  Measured used;
};

class Resolver {
public:
  Resolver(const ListRow& row, const Settings& settings, Flags& flags);
  Resolver(const Resolver&) = delete;
  Resolver& operator=(const Resolver&) = delete;
  ~Resolver() = default;

  /// The first route of hz/routes.hpp that leads to the quantity: the natural logarithm of it, for teff in K. Empty
  /// when none does, or when a cell on the way cannot be read (then problem() says so and the row has no answer).
  [[nodiscard]] std::optional<Form> find(Quantity quantity);
  [[nodiscard]] const TeffInput* teff();
  [[nodiscard]] const std::optional<Problem>& problem() const { return problem_; }
  /// Why relations of main-sequence stars do not hold for the star, in words; empty when they do.
  [[nodiscard]] std::string off_main_sequence() const;

  /// While it lives, nothing is flagged, and what cannot be read counts as absent.
  class Quiet {
  public:
    explicit Quiet(Resolver& resolver) : resolver_(resolver), before_(resolver.quiet_) { resolver.quiet_ = true; }
    Quiet(const Quiet&) = delete;
    Quiet& operator=(const Quiet&) = delete;
    ~Quiet() { resolver_.quiet_ = before_; }

  private:
    Resolver& resolver_;
    bool before_;
  };

  /// Raises what the sources and marks of a form that is used have to say.
  void raise(const Form& form);

  // The blocks that routes are made of.
  [[nodiscard]] std::optional<Input> take(Quantity quantity);
  [[nodiscard]] std::optional<Form> log_of(Quantity quantity);          // ln of a stated value
  [[nodiscard]] std::optional<Form> log_of_decadic(Quantity quantity);  // ln of what is stated in dex
  [[nodiscard]] std::optional<Form> stated(Quantity quantity);          // a stated value as it is
  [[nodiscard]] std::optional<Form> magnitude(Quantity quantity);       // without extinction
  [[nodiscard]] std::optional<Form> color(Quantity quantity);           // without reddening
  [[nodiscard]] std::optional<Form> absolute_k();
  [[nodiscard]] std::optional<Form> subtype();
  /// y(x) with the relation's scatter, which also carries the skewness that the relation's bend gives to y; empty
  /// outside its range and where it does not hold. `quantity` is what for.
  [[nodiscard]] std::optional<Form> apply(std::string_view key, const std::optional<Form>& x, Quantity quantity);
  /// Whether a relation may be used for this star.
  [[nodiscard]] bool holds(const Relation& relation) const;
  /// "distance" where it is stated, "parallax" where it follows from one.
  /// Within 100 pc, where extinction hardly matters (the Local Bubble; common practice).
  [[nodiscard]] bool is_nearby();
  [[nodiscard]] static std::string_view distance_word(const Form& distance);

  [[nodiscard]] const ListRow& row() const { return row_; }
  [[nodiscard]] const Settings& settings() const { return settings_; }
  [[nodiscard]] const Inputs& inputs() const { return inputs_; }
  [[nodiscard]] Sources& sources() { return sources_; }
  [[nodiscard]] const std::optional<SpectralType>& type() const { return type_; }

private:
  [[nodiscard]] Form without_extinction(Form form, double ratio);
  [[nodiscard]] TeffInput input_of(const Form& teff) const;

  const ListRow& row_;
  const Settings& settings_;
  Flags& flags_;
  Inputs inputs_;
  Sources sources_;
  std::optional<SpectralType> type_;
  std::optional<TeffInput> teff_;
  bool teff_sought_ = false;
  std::set<Quantity> busy_;  // quantities being looked for: a route must not lead through itself
  bool quiet_ = false;
  std::optional<Problem> problem_;
};

}  // namespace hz
