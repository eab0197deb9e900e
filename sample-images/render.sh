#!/bin/sh
# Draws the sample photos again from their scenes, with their truths and straight views.
# Usage: sample-images/render.sh [NAME...]     all five without a name
set -eu
here=$(cd "$(dirname "$0")" && pwd)
[ $# -gt 0 ] || set -- overcast morning noon afternoon frost
for name in "$@"; do
  "$here/../cli/plumbray" simulate "$here/$name.truth.sight.json" "$here/$name.scene.json" \
    --out "$here/$name.jpg"
done
