#!/usr/bin/env bash
# Does all the set-up on Debian 12 (as root, or as a user with sudo), and then one of three things:
#   bash cmake/hzmap.sh demo              ranks the bundled list and draws figures, into lantern-demo/
#   bash cmake/hzmap.sh test              builds everything and runs the whole test suite
#   bash cmake/hzmap.sh install [PREFIX]  puts program, library, manual page and data under PREFIX (/usr/local)
# A second run repeats no set-up. All three share the folder build/, so that nothing is compiled twice.
set -euo pipefail
called_from=$PWD
cd "$(dirname "${BASH_SOURCE[0]}")/.."
readonly build=build log=build/hzmap.log

say() { echo "hzmap.sh: $*" >&2; }
die() { say "$*" && exit 1; }

# quietly WHAT COMMAND...: one line on the screen; the command's own output is kept in the log and shown when it fails.
quietly() {
  local what=$1
  shift
  say "$what"
  "$@" >"$log" 2>&1 </dev/null || { cat "$log" >&2 && say "$what: failed, see above" && return 1; }
}

# cached NAME: the value of a CMake cache entry of the build folder; empty without one.
cached() { sed -n "s/^$1:[A-Z]*=//p" "$build/CMakeCache.txt" 2>/dev/null || true; }

# configure TESTS: ON builds the tests too. What is configured already stays, tests included.
configure() {
  local tests=$1 werror=OFF
  [[ $(cached HZ_BUILD_TESTS) != ON ]] || tests=ON
  [[ ${CI:-false} == false ]] || werror=ON
  if [[ -e $build/build.ninja && $(cached CMAKE_BUILD_TYPE) == Release && $(cached HZ_BUILD_TESTS) == "$tests" &&
    $(cached HZ_WERROR) == "$werror" ]]; then
    return
  fi
  quietly "configuring in $build/" \
    cmake -C cmake/release.cmake -G Ninja -S . -B "$build" -DHZ_BUILD_TESTS="$tests" -DHZ_WERROR="$werror" ||
    { rm -f "$build/CMakeCache.txt" && exit 1; }  # else the next run would take this for configured
}

# compile TARGET: with all cores.
compile() {
  quietly "building $1 (minutes the first time)" \
    cmake --build "$build" --target "$1" --parallel "$(nproc)"
}

# show ARGUMENT...: prints and runs a command of the program just built.
show() {
  local argument line='$ hzmap'
  for argument in "$@"; do
    [[ $argument != *' '* ]] || argument="'$argument'"
    line+=" $argument"
  done
  echo "$line" >&2
  "$build/apps/hzmap" "$@" || die "hzmap $1 failed, see above"
}

demo() {
  local list=catalogs/lantern/lantern.csv out=lantern-demo figure
  bash cmake/debian-packages.sh run
  configure OFF
  compile hzmap
  mkdir -p "$out"
  show rank "$list" -o "$out/ranked.csv"
  for figure in lantern-27.svg lantern-27.png; do show draw wedge "$list" 'Lantern 27' -o "$out/$figure"; done
  for figure in lanes.svg lanes.png; do show draw lanes "$list" -o "$out/$figure"; done
  echo
  echo "The whole ranking and the figures:"
  realpath --relative-to="$called_from" "$out"/{ranked.csv,lantern-27.svg,lantern-27.png,lanes.svg,lanes.png}
}

run_tests() {
  bash cmake/debian-packages.sh run test
  configure ON
  compile all
  ctest --test-dir "$build" --output-on-failure --no-tests=error --parallel "$(nproc)"
}

# install_under PREFIX: with sudo only where the folder needs it.
install_under() {
  local prefix existing root=()
  prefix=$(realpath -m "$1")
  bash cmake/debian-packages.sh run
  configure OFF
  compile installed
  existing=$prefix
  while [[ ! -e $existing ]]; do existing=$(dirname "$existing"); done
  [[ -w $existing ]] || root=(sudo)
  quietly "installing under $prefix" "${root[@]}" cmake --install "$build" --prefix "$prefix"
}

mkdir -p "$build" || die "the folder $PWD cannot be written to"
case "${1:-}:$#" in
  demo:1) demo ;;
  test:1) run_tests ;;
  install:[12]) install_under "$(cd "$called_from" && realpath -m "${2:-/usr/local}")" ;;
  *) say "say what to do: demo, test or install [PREFIX]" && exit 2 ;;
esac
