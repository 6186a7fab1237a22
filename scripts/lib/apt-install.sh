#!/usr/bin/env bash
# Installs Debian packages, as root or by sudo. usage: apt-install.sh LABEL PACKAGE…   LABEL begins each line said.
set -euo pipefail
label=$1
shift
say() { printf '%-10s %s\n' "$label" "$*"; }
die() { say "$@" >&2; exit 1; }

command -v apt-get >/dev/null || die "$* is not installed, and this is not a Debian: install it by hand."
if [ "$EUID" -ne 0 ]; then
  command -v sudo >/dev/null || die "$* is not installed, and there is no sudo here. As root: apt-get install $*"
  say "$* is not installed: asking sudo for leave to install it"
  if [ -t 0 ]; then sudo -v; else sudo -n -v 2>/dev/null; fi || die "sudo refused. As root: apt-get install $*"
  exec sudo bash "$(readlink -f "$0")" "$label" "$@"
fi

log=$(mktemp)
no_cluster=/etc/postgresql-common/createcluster.d/jamnut.conf
trap 'rm -f "$log" "$no_cluster"' EXIT
free=$(df -Pk /usr | awk 'NR == 2 { print $4 }')
[ "$free" -ge 1000000 ] || die "The disk is full: /usr has $((free / 1000)) MB free, 1000 MB are needed."

quietly() {
  "$@" >"$log" 2>&1 </dev/null && return
  if grep -q 'No space left on device' "$log"; then die "The disk is full: no space left to install $packages."; fi
  die "apt-get could not install $packages: $(grep -E '^(E|dpkg: error)' "$log" | head -n 1)"
}
packages=$*
export DEBIAN_FRONTEND=noninteractive
# Debian's package would make and start a cluster of its own on port 5432, which nobody asked for.
mkdir -p "$(dirname "$no_cluster")"
echo 'create_main_cluster = false' >"$no_cluster"
say "installing $* (apt-get, under a minute)"
quietly apt-get update -q
quietly apt-get install -q -y --no-install-recommends "$@"
