#include "text_measure.hpp"

#include <fontconfig/fontconfig.h>
#include <pango/pangocairo.h>
#include <pango/pangofc-fontmap.h>

#include <cmath>

#include "font_faces.hpp"
#include "hz/error.hpp"
#include "hz/plots/fonts.hpp"

namespace hz::plots {
namespace {

struct Release {
  void operator()(FcConfig* config) const { FcConfigDestroy(config); }
  void operator()(FcCharSet* characters) const { FcCharSetDestroy(characters); }
  void operator()(PangoFontMap* map) const { g_object_unref(map); }
  void operator()(PangoContext* context) const { g_object_unref(context); }
  void operator()(PangoLayout* layout) const { g_object_unref(layout); }
  void operator()(cairo_font_options_t* options) const { cairo_font_options_destroy(options); }
  void operator()(char* text) const { g_free(text); }
};
template <class T>
using Owned = std::unique_ptr<T, Release>;

/// A set of fonts that holds ours and nothing of the system.
Owned<FcConfig> private_fonts() {
  Owned<FcConfig> config(FcConfigCreate());
  const auto folder = font_folder();
  for (const auto& face : font_faces) {
    const std::string file = (folder / face).string();
    if (!FcConfigAppFontAddFile(config.get(), reinterpret_cast<const FcChar8*>(file.c_str())))
      throw Error(Fault::output, "cannot read the font " + file + "; install hzmap again");
  }
  return config;
}

Owned<FcCharSet> characters_of(FcConfig* config) {
  Owned<FcCharSet> all(FcCharSetCreate());
  const FcFontSet* fonts = FcConfigGetFonts(config, FcSetApplication);
  for (int i = 0; i < fonts->nfont; ++i) {
    FcCharSet* one = nullptr;
    if (FcPatternGetCharSet(fonts->fonts[i], FC_CHARSET, 0, &one) == FcResultMatch)
      FcCharSetMerge(all.get(), one, nullptr);
  }
  return all;
}

/// Widths and shapes that do not depend on the surface or its scale.
void make_scalable(PangoContext* context) {
  const Owned<cairo_font_options_t> options(cairo_font_options_create());
  cairo_font_options_set_hint_style(options.get(), CAIRO_HINT_STYLE_NONE);
  cairo_font_options_set_hint_metrics(options.get(), CAIRO_HINT_METRICS_OFF);
  cairo_font_options_set_antialias(options.get(), CAIRO_ANTIALIAS_GRAY);
  pango_cairo_context_set_font_options(context, options.get());
  pango_cairo_context_set_resolution(context, 72);
  pango_context_set_round_glyph_positions(context, FALSE);
  pango_context_set_language(context, pango_language_from_string("en"));
  pango_context_set_base_dir(context, PANGO_DIRECTION_LTR);
}

constexpr gunichar no_break_space = 0xA0;

int pango_units(double points) { return static_cast<int>(std::lround(points * PANGO_SCALE)); }

void insert(PangoAttrList* list, PangoAttribute* attribute, std::size_t from, std::size_t to) {
  attribute->start_index = static_cast<guint>(from);
  attribute->end_index = static_cast<guint>(to);
  pango_attr_list_insert(list, attribute);
}

/// Explicit sizes and rises: pango's own sub and superscripts change their size with the scale of the surface.
void insert_script(PangoAttrList* list, Script script, double size, std::size_t from, std::size_t to) {
  if (script == Script::normal) return;
  const double rise = script == Script::sub ? -0.18 : 0.38;
  insert(list, pango_attr_size_new_absolute(pango_units(0.75 * size)), from, to);
  insert(list, pango_attr_rise_new(pango_units(rise * size)), from, to);
}

Owned<PangoLayout> layout_of(PangoContext* context, const Text& text, const TextStyle& style) {
  Owned<PangoLayout> layout(pango_layout_new(context));
  PangoFontDescription* font = pango_font_description_from_string(font_families);
  pango_font_description_set_absolute_size(font, pango_units(style.size));
  if (style.bold) pango_font_description_set_weight(font, PANGO_WEIGHT_BOLD);
  if (style.italic) pango_font_description_set_style(font, PANGO_STYLE_ITALIC);
  pango_layout_set_font_description(layout.get(), font);
  pango_font_description_free(font);

  PangoAttrList* list = pango_attr_list_new();
  std::string words;
  for (const TextRun& run : text) {
    const std::size_t from = words.size();
    words += run.text;
    insert_script(list, run.script, style.size, from, words.size());
    if (run.bold) insert(list, pango_attr_weight_new(PANGO_WEIGHT_BOLD), from, words.size());
  }
  pango_layout_set_attributes(layout.get(), list);
  pango_attr_list_unref(list);
  pango_layout_set_single_paragraph_mode(layout.get(), TRUE);
  pango_layout_set_auto_dir(layout.get(), FALSE);
  pango_layout_set_text(layout.get(), words.c_str(), static_cast<int>(words.size()));
  return layout;
}

}  // namespace

struct TextMeasure::Pango {
  Owned<FcConfig> config = private_fonts();
  Owned<FcCharSet> characters = characters_of(config.get());
  Owned<PangoFontMap> map{pango_cairo_font_map_new_for_font_type(CAIRO_FONT_TYPE_FT)};
  Owned<PangoContext> context;

  Pango() {
    pango_fc_font_map_set_config(PANGO_FC_FONT_MAP(map.get()), config.get());
    context.reset(pango_font_map_create_context(map.get()));
    make_scalable(context.get());
  }
  /// pango 1.50 does not let go of a map's configuration when the map ends.
  ~Pango() { pango_fc_font_map_set_config(PANGO_FC_FONT_MAP(map.get()), nullptr); }
  Pango(const Pango&) = delete;
  Pango& operator=(const Pango&) = delete;
  Pango(Pango&&) = delete;
  Pango& operator=(Pango&&) = delete;

  /// The words laid out for a surface and its scale.
  [[nodiscard]] Owned<PangoLayout> on(cairo_t* cr, const TextMark& mark) const {
    const Owned<PangoContext> surface(pango_font_map_create_context(map.get()));
    make_scalable(surface.get());
    pango_cairo_update_context(cr, surface.get());
    return layout_of(surface.get(), mark.text, mark.style);
  }

  [[nodiscard]] bool holds(gunichar character) const {
    return FcCharSetHasChar(characters.get(), character) || g_unichar_iszerowidth(character);
  }
};

TextMeasure::TextMeasure() : pango_(std::make_unique<Pango>()) {}
TextMeasure::~TextMeasure() = default;

double TextMeasure::advance(const Text& text, const TextStyle& style) const {
  const Owned<PangoLayout> layout = layout_of(pango_->context.get(), text, style);
  PangoRectangle logical;
  pango_layout_line_get_extents(pango_layout_get_line_readonly(layout.get(), 0), nullptr, &logical);
  return static_cast<double>(logical.width) / PANGO_SCALE;
}

TextMark TextMeasure::placed(Text text, const TextStyle& style, Point baseline) const {
  const Owned<PangoLayout> layout = layout_of(pango_->context.get(), text, style);
  PangoRectangle ink;
  pango_layout_line_get_extents(pango_layout_get_line_readonly(layout.get(), 0), &ink, nullptr);
  const Box box{baseline.x + static_cast<double>(ink.x) / PANGO_SCALE,
                baseline.y + static_cast<double>(ink.y) / PANGO_SCALE, static_cast<double>(ink.width) / PANGO_SCALE,
                static_cast<double>(ink.height) / PANGO_SCALE};
  return {std::move(text), style, baseline, box};
}

Text TextMeasure::printable(std::string_view typed) const {
  const Owned<char> valid(g_utf8_make_valid(typed.data(), static_cast<gssize>(typed.size())));
  Text text;
  for (const char* at = valid.get(); *at != '\0'; at = g_utf8_next_char(at)) {
    const gunichar character = g_utf8_get_char(at);
    const bool sun = character == 0x2609 || character == 0x2299;
    const Script script = sun || character == 0x2295 ? Script::sub : Script::normal;
    if (text.empty() || text.back().script != script) text.push_back({"", script});
    std::string& words = text.back().text;
    if (sun)
      words += "\u2299";
    else if ((g_unichar_isspace(character) && character != no_break_space) || g_unichar_iscntrl(character))
      words += ' ';
    else if (pango_->holds(character))
      words.append(at, static_cast<const char*>(g_utf8_next_char(at)));
    else
      words += replacement_sign;
  }
  return text;
}

void TextMeasure::draw(cairo_t* cr, const TextMark& mark) const {
  const Color& color = mark.style.color;
  cairo_set_source_rgb(cr, color.red, color.green, color.blue);
  cairo_move_to(cr, mark.baseline.x, mark.baseline.y);
  const Owned<PangoLayout> layout = pango_->on(cr, mark);
  pango_cairo_show_layout_line(cr, pango_layout_get_line_readonly(layout.get(), 0));
}

void TextMeasure::outline(cairo_t* cr, const TextMark& mark) const {
  cairo_move_to(cr, mark.baseline.x, mark.baseline.y);
  const Owned<PangoLayout> layout = pango_->on(cr, mark);
  pango_cairo_layout_line_path(cr, pango_layout_get_line_readonly(layout.get(), 0));
}

}  // namespace hz::plots
