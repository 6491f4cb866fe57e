#include "figure_key.hpp"

#include <algorithm>
#include <functional>

#include "key.hpp"
#include "palette.hpp"
#include "planet_marks.hpp"
#include "zone_marks.hpp"

namespace hz::plots {
namespace {

/// Everything the key can say, about one set of systems.
class KeyWriter {
public:
  KeyWriter(Canvas& canvas, const std::vector<FigureStar>& stars, const FigureOptions& options, const KeyPlan& plan)
      : canvas_(canvas), key_(canvas), stars_(stars), options_(options), plan_(plan), unit_(plan.unit) {}

  double draw(double top) {
    if (any_planet([](const FigurePlanet&) { return true; })) add_planets();
    add_zones();
    if (plan_.kind == FigureKind::wedge &&
        any_planet([](const FigurePlanet& planet) { return planet.span.has_value(); }))
      add_line({palette::grey, 0.7, {}}, span_stroke());
    add_notes();
    return key_.draw(top);
  }

private:
  using PlanetTest = std::function<bool(const FigurePlanet&)>;

  [[nodiscard]] bool any_planet(const PlanetTest& test) const {
    return std::any_of(stars_.begin(), stars_.end(), [&](const FigureStar& star) {
      return std::any_of(star.planets.begin(), star.planets.end(), test);
    });
  }

  [[nodiscard]] bool any_limit(const std::function<bool(const FigureLimit&)>& test) const {
    return std::any_of(stars_.begin(), stars_.end(), [&](const FigureStar& star) {
      return std::any_of(star.limits.begin(), star.limits.end(), test);
    });
  }

  void add_disc(double size, std::optional<double> p, bool known_radius, const Text& words) {
    DiscMark sample = disc({0, 0}, size, p, known_radius);
    sample.halo = 0;
    key_.add_sample({sample}, words);
  }

  void add_planets() {
    add_fillings();
    add_sizes();
    if (any_planet(
            [](const FigurePlanet& planet) { return planet.semi_major_axis.minus || planet.semi_major_axis.plus; })) {
      key_.start_group();
      key_.add_sample({WhiskerMark{-8, 8, 0, whisker_cap, false, false, {palette::ink, 0.7, {}}}}, {{"68 %"}});
    }
  }

  void add_fillings() {
    const double size = 1.1 * unit_;
    key_.start_group();
    const bool conservative = options_.filled_by == FilledZone::conservative;
    key_.add_words({{conservative ? "P in the conservative zone" : "P in the optimistic zone"}});
    add_disc(size, 0, true, {{"0"}});
    add_disc(size, 0.5, true, {{"0.5"}});
    add_disc(size, 1, true, {{"1"}});
    if (any_planet([&](const FigurePlanet& planet) { return !filling(planet, options_.filled_by); }))
      add_disc(size, std::nullopt, true, {{"not known"}});
  }

  void add_sizes() {
    key_.start_group();
    if (any_planet([](const FigurePlanet& planet) { return measured_radius(planet).has_value(); })) {
      key_.add_words({{"radius"}});
      const bool giants = any_planet([](const FigurePlanet& planet) { return measured_radius(planet) > 6; });
      for (const int radius : {1, giants ? 4 : 2, giants ? 12 : 4}) {
        Text words{{std::to_string(radius)}};
        if (radius >= 4 && (radius == 12) == giants) words = {{std::to_string(radius) + " R"}, {"⊕", Script::sub}};
        add_disc(disc_radius(radius, unit_), 0, true, words);
      }
    }
    if (any_planet([](const FigurePlanet& planet) { return !measured_radius(planet); }))
      add_disc(disc_radius(std::nullopt, unit_), 0, false, {{"radius not measured"}});
  }

  /// Two edges with the shade between them, the outer one fading.
  void add_zone(const Color& shade, const Stroke& stroke, const std::string& words) {
    const double half = 0.5 * canvas_.size();
    const BarMark bar{{-8, -half, 16, 2 * half},
                      {{-8, palette::white}, {-4.5, shade}, {4.5, shade}, {8, palette::white}}};
    const auto edge = [&](double x) { return LineMark{{{x, -half}, {x, half}}, stroke}; };
    key_.add_sample({bar, edge(-6.2), edge(6.2)}, {{words}});
  }

  void add_zones() {
    if (stars_.empty() || !any_limit([](const FigureLimit&) { return true; })) return;
    key_.start_group();
    if (any_limit([](const FigureLimit& limit) { return is_conservative(limit.role); }))
      add_zone(palette::conservative, limit_stroke(LimitRole::conservative_inner), "conservative zone");
    if (any_limit([](const FigureLimit& limit) { return !is_conservative(limit.role); }))
      add_zone(palette::optimistic, limit_stroke(LimitRole::optimistic_inner), "optimistic zone");
    if (any_limit([](const FigureLimit& limit) { return limit.distance.minus || limit.distance.plus; }))
      key_.add_words({{"edges fade over their 68 %"}});
    if (any_limit([](const FigureLimit& limit) { return limit.held; })) add_held();
  }

  void add_held() {
    const double half = 0.55 * canvas_.size();
    std::vector<Shape> shapes{LineMark{{{0, -half}, {0, half}}, limit_stroke(LimitRole::conservative_inner)}};
    for (const double y : {-0.8 * half, 0.0, 0.8 * half})
      shapes.emplace_back(LineMark{{{0, y}, {tooth_length, y}}, tooth_stroke()});
    key_.start_group();
    key_.add_sample(shapes, {{"limit held at the end of its fitted range"}});
  }

  void add_line(const Stroke& orbit, const Stroke& span) {
    key_.start_group();
    key_.add_sample({LineMark{{{0, 0}, {14, 0}}, orbit}}, {{"orbit"}});
    key_.add_sample({LineMark{{{0, 0}, {14, 0}}, span}}, {{"span of an eccentric orbit"}});
  }

  void add_notes() {
    std::string note = options_.limit_set.empty() ? "" : "limits: " + options_.limit_set;
    if (!options_.runaway_planet_mass.empty())
      note += (note.empty() ? "" : ", ") + ("runaway greenhouse for " + options_.runaway_planet_mass);
    if (!note.empty()) key_.add_note(note);
    if (has_replacement()) key_.add_note(std::string(replacement_sign) + " a character these fonts lack");
    if (!plan_.note.empty()) key_.add_note(plan_.note);
  }

  [[nodiscard]] bool has_replacement() const {
    const auto replaced = [&](const std::string& name) {
      return plain(canvas_.measure().printable(name)).find(replacement_sign) != std::string::npos;
    };
    return any_planet([&](const FigurePlanet& planet) {
             return replaced(planet.label.empty() ? planet.name : planet.label);
           }) ||
           any_limit([&](const FigureLimit& limit) { return replaced(limit.title); }) ||
           std::any_of(stars_.begin(), stars_.end(), [&](const FigureStar& star) { return replaced(star.name); });
  }

  Canvas& canvas_;
  Key key_;
  const std::vector<FigureStar>& stars_;
  const FigureOptions& options_;
  const KeyPlan& plan_;
  double unit_;
};

}  // namespace

Stroke span_stroke() { return {palette::grey, 0.7, {0, 2}}; }

double draw_key(Canvas& canvas, const std::vector<FigureStar>& stars, const FigureOptions& options, const KeyPlan& plan,
                double top) {
  return KeyWriter(canvas, stars, options, plan).draw(top);
}

}  // namespace hz::plots
