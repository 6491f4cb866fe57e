#!/usr/bin/env bash
# One command-line test (cmake/HzCliTest.cmake says how it is meant):  run_one.sh PROGRAM KEPT EXIT LINE
set -uo pipefail
program=$1 kept=$2 expected=$3 line=$4
here=$(cd "$(dirname "${BASH_SOURCE[0]}")" && pwd)
scratch=$(mktemp -d)
trap 'rm -rf "$scratch"' EXIT
mkdir "$scratch/work" && cd "$scratch/work" || exit 99
ln -s "$here/lists" lists
ln -s "$here/../../catalogs/lantern/lantern.csv" lantern.csv

PATH=$(dirname "$program"):$PATH
export PATH TERM=dumb
unset NO_COLOR
bash -c "$line" </dev/null >"$scratch/out" 2>"$scratch/err"
code=$?

failed=0
if [[ $code -ne $expected ]]; then
  echo "exit code $code, expected $expected"
  failed=1
fi
for stream in out err; do
  if [[ -n ${HZ_RENEW:-} ]]; then
    mkdir -p "$(dirname "$kept")"
    rm -f "$kept.$stream"
    if [[ -s $scratch/$stream ]]; then cp "$scratch/$stream" "$kept.$stream"; fi
  fi
  if [[ -e $kept.$stream ]]; then wanted=$kept.$stream; else wanted=/dev/null; fi
  diff -u --label "kept $stream" --label "printed $stream" "$wanted" "$scratch/$stream" || failed=1
done
if [[ $failed -ne 0 ]]; then
  echo "the line was: $line"
  cat "$scratch/err"
fi
exit $failed
