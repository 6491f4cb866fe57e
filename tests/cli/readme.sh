#!/usr/bin/env bash
# Runs every command of the README's console blocks and compares what it prints, standard error included.
#   readme.sh PROGRAM README     with HZ_RENEW set, the README's outputs are written anew instead
set -uo pipefail
program=$(realpath "$1") readme=$(realpath "$2")
root=$(dirname "$readme")
scratch=$(mktemp -d)
trap 'rm -rf "$scratch"' EXIT
mkdir "$scratch/work" && cd "$scratch/work" || exit 99
ln -s "$root/catalogs" catalogs
PATH=$(dirname "$program"):$PATH
export PATH TERM=dumb
unset NO_COLOR

commands=0
inside=no
while IFS= read -r line; do
  case $line in
    '```console') inside=yes ;;
    '```') [[ $inside == no ]] || inside=no ;;
  esac
  if [[ $inside == yes && $line == '$ '* ]]; then
    printf '%s\n' "$line"
    bash -c "${line#'$ '}" </dev/null 2>&1 || echo "exit code $?"
    commands=$((commands + 1))
    inside=printed
  elif [[ $inside != printed || $line == '```' ]]; then
    printf '%s\n' "$line"
  fi
done <"$readme" >"$scratch/printed"

[[ $commands -gt 0 ]] || { echo "the README has no commands" && exit 1; }
if [[ -n ${HZ_RENEW:-} ]]; then cp "$scratch/printed" "$readme"; fi
diff -u --label README.md --label "what is printed" "$readme" "$scratch/printed" || exit 1
cmp lantern-27.svg "$root/plots/gallery/lantern-27.svg" || exit 1
echo "$commands commands of the README print what it says"
