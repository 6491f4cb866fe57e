// Scenes onto any cairo surface.
#pragma once
#include "hz/plots/scene.hpp"
#include "text_measure.hpp"

namespace hz::plots {

/// Paints the page white and every mark in order. One unit of the surface's user space is one point.
void paint(cairo_t* cr, const Scene& scene, const TextMeasure& measure);

}  // namespace hz::plots
