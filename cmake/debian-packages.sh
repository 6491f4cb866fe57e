#!/usr/bin/env bash
# Installs what is missing of the packages of cmake/debian-packages.txt for the uses named:
#   bash cmake/debian-packages.sh run test
# Nothing missing: back at once, without network. No apt-get: says what is needed and goes on.
set -euo pipefail
list="$(dirname "${BASH_SOURCE[0]}")/debian-packages.txt"

die() { echo "debian-packages.sh: $*" >&2 && exit 1; }

# The packages of the uses named, one a line.
wanted() {
  awk -v uses=" $* " '!/^#/ && NF && index(uses, " " $2 " ") { print $1 }' "$list"
}

# Those of the packages named that are not installed.
missing() {
  local package
  for package in "$@"; do
    dpkg-query -W -f='${db:Status-Status}\n' "$package" 2>/dev/null | grep -qx installed || echo "$package"
  done
}

as_root() {
  if [[ $(id -u) -eq 0 ]]; then "$@"; else sudo "$@"; fi
}

apt() {
  as_root env DEBIAN_FRONTEND=noninteractive apt-get -q -y -o DPkg::Lock::Timeout=120 "$@" >>"$log" 2>&1 </dev/null
}

[[ $# -gt 0 ]] || die "name at least one use: run, test or lint"
mapfile -t packages < <(wanted "$@")
[[ ${#packages[@]} -gt 0 ]] || die "no package is listed for '$*' in $list; the uses are run, test and lint"
if ! command -v apt-get >/dev/null || ! command -v dpkg-query >/dev/null; then
  echo "debian-packages.sh: no apt-get here; going on with what is installed. Needed (Debian 12 names): ${packages[*]}" >&2
  exit 0
fi
mapfile -t packages < <(missing "${packages[@]}")
[[ ${#packages[@]} -gt 0 ]] || exit 0
if [[ $(id -u) -ne 0 ]] && ! command -v sudo >/dev/null; then
  die "installing packages needs root and there is no sudo; as root, run: apt-get install --no-install-recommends ${packages[*]}"
fi

log=$(mktemp)
trap 'rm -f "$log"' EXIT
echo "debian-packages.sh: installing ${#packages[@]} packages: ${packages[*]}" >&2
apt update || { cat "$log" >&2 && die "the package lists could not be fetched (see above); is there a network?"; }
apt install --no-install-recommends "${packages[@]}" ||
  { cat "$log" >&2 && die "apt-get could not install them (see above); is there a network, and is this Debian 12?"; }
