// Prints one published number through the installed library.
#include <cstdio>

#include "hz/flux_limit.hpp"
#include "hz/limit_set.hpp"

int main() {
  const hz::LimitSet* set = hz::LimitCatalog::published().find("K14");
  if (set == nullptr || !set->conservative) return 1;
  const hz::FluxLimit& runaway = set->limits.at(set->conservative->inner);
  const auto answer = runaway.insolation(5780.0, 1.0, hz::BeyondRange::refuse);
  if (!answer || answer->held) return 1;
  // Source: Kopparapu et al. 2014, ApJL 787, L29, Table 1, runaway greenhouse, 1 Earth mass: S_eff,sun = 1.107 (t = 0).
  std::printf("%s of 1 Earth mass at 5780 K: %.3f\n", runaway.title().c_str(), answer->value);
  return 0;
}
