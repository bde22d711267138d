#!/usr/bin/env bash
# Makes the pictures of the guide anew; the test that compares them with the program says when that is due. Needs pdftoppm (poppler-utils).
set -euo pipefail
cd "$(dirname "$0")/guide"
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
rebuild=(dotnet run --project ../../src/RebuildPlanner.Cli --)
"${rebuild[@]}" form --file 1-taken-in.json --date 2026-11-16 --out "$work/form.pdf"
"${rebuild[@]}" sheet --file 3-machined.json --stage "as machined" --date 2026-11-30 --out "$work/sheet.pdf"
pdftoppm -r 75 -gray -png -f 1 -l 1 "$work/form.pdf" "$work/form"
pdftoppm -r 75 -gray -png -f 1 -l 3 "$work/sheet.pdf" "$work/sheet"
for page in "$work"/*.png; do
  name=$(basename "$page" .png)
  cp "$page" "${name%-*}-$((10#${name##*-})).png"
done
(cd "$work" && sha256sum form.pdf sheet.pdf) > pictures.sha256
