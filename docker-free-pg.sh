#!/usr/bin/env bash
# Jamnut's own PostgreSQL, from Debian's packages and without a container: a private cluster on loopback, in .data/pg.
#   ./docker-free-pg.sh start | stop | status            [DATA-DIR]
#   ./docker-free-pg.sh reset | drop                     [DATA-DIR]   delete the cluster; reset makes a new, empty one
#   ./docker-free-pg.sh url | psql     [web | owner]     [DATA-DIR]   as the web server's role, or the owner's
#   ./docker-free-pg.sh database NAME                    [DATA-DIR]   a fresh, empty database, deleting one of that name
# DATA-DIR (else JAMNUT_DATA_DIR, else .data beside this file) also keeps the passwords: secrets/pg-*, mode 0600.
# JAMNUT_PG_THROWAWAY=1 makes a cluster that need not survive a power cut, for tests.
set -euo pipefail
umask 077

here=$(dirname "$(readlink -f "${BASH_SOURCE[0]}")")
say() { printf '%-10s %s\n' database "$*"; }
die() { printf '%-10s %s\n' database "$*" >&2; exit 1; }
is_root() { [ "$EUID" -eq 0 ]; }
usage() { sed -n '2,8s/^# \{0,1\}//p' "$here/docker-free-pg.sh" >&2; exit 2; }

verb=${1:-}
[ $# -eq 0 ] || shift
role=web name=jamnut
case $verb in
  start | stop | status | reset | drop) ;;
  url | psql) case ${1:-} in web | owner) role=$1; shift ;; esac ;;
  database) name=${1:-}; shift || true; [[ $name =~ ^[a-z][a-z0-9_]{0,50}$ ]] || usage ;;
  *) usage ;;
esac
if [ $# -gt 0 ]; then data=$(realpath -m -- "$1"); else data=$(cd "$here" && realpath -m -- "${JAMNUT_DATA_DIR:-.data}"); fi
cluster=$data/pg
secrets=$data/secrets

# ---- where, and as whom -------------------------------------------------------------------------------------------

# The cluster really lies at $real: $cluster itself, or what it links to (see place_new_cluster).
real=$(realpath -m -- "$cluster")
has_cluster() { [ -d "$real" ]; }

# The server refuses to run as root, so root runs it as the cluster's owner: postgres, or who made it.
server_user() {
  local user
  if has_cluster; then user=$(stat -c %U "$real"); elif is_root; then user=postgres; else user=$(id -un); fi
  if is_root && [ "$user" = root ]; then user=postgres; fi
  echo "$user"
}
as_server() { if is_root; then (cd / && runuser -u "$user" -- "$@"); else (cd / && "$@"); fi; }

check_owner() {
  user=$(server_user)
  is_root && return
  [ "$user" = "$(id -un)" ] || die "The database in $cluster belongs to $user: run this as root, or set JAMNUT_DATA_DIR."
  [ ! -e "$data" ] || [ -w "$data" ] || die "$data belongs to $(stat -c %U "$data"): run this as root, or set JAMNUT_DATA_DIR."
}

bin() { # a cluster can only be served by the major version that made it
  local version='*' found
  if has_cluster; then version=$(cat "$real/PG_VERSION"); fi
  # shellcheck disable=SC2086 # the pattern has to expand
  found=$(ls -d /usr/lib/postgresql/$version/bin/initdb 2>/dev/null | sort -V | tail -n 1) || true
  [ -n "$found" ] && dirname "$found"
}

need_space() { # $1 folder: an empty cluster and its first log take some 100 MB, packages 300
  local free
  free=$(df -Pk "$1" | awk 'NR == 2 { print $4 }')
  [ "$free" -ge 1000000 ] || die "The disk is full: $1 has $((free / 1000)) MB free, 1000 MB are needed."
}

secret() { cat "$secrets/pg-$1" 2>/dev/null ||
  die "$secrets/pg-$1 is missing, and with it the way into the database. './docker-free-pg.sh reset' makes a new, empty one."; }

# ---- the running server -------------------------------------------------------------------------------------------

# After a crash the pid file may name any process: only a server started in our folder is ours.
running() {
  local pid
  pid=$(head -n 1 "$real/postmaster.pid" 2>/dev/null) || return 1
  grep -zqxF -- "$real" "/proc/$pid/cmdline" 2>/dev/null
}
ready() { running && [ "$(sed -n 8p "$real/postmaster.pid" 2>/dev/null | tr -d ' ')" = ready ]; }
port() { sed -n 's/^port = \([0-9]*\).*/\1/p' "$real/postgresql.conf" | tail -n 1; }
listening() { (exec 3<>"/dev/tcp/127.0.0.1/$1") 2>/dev/null; }
free_port() {
  local candidate
  while :; do
    candidate=$((20000 + RANDOM % 12000)) # below the range from which the kernel gives out ports
    listening "$candidate" || break
  done
  echo "$candidate"
}
url() { echo "postgres://jamnut_$1:$(secret "$1")@127.0.0.1:$(port)/$name"; }
as_admin() { PGPASSWORD=$(secret admin) "$pg/psql" -XqAt -v ON_ERROR_STOP=1 -h 127.0.0.1 -p "$(port)" -U jamnut_admin "$@"; }

why() { # $1 what failed, $2 file with its last words
  if grep -q 'No space left on device' "$2"; then die "The disk is full: $1 found no space left in $real."; fi
  die "$1 failed: $(grep -E 'FATAL|ERROR|error:|PANIC' "$2" | tail -n 1 | sed 's/.*\(FATAL\|ERROR\|error\|PANIC\): *//') ($2)"
}

start_server() {
  local pid tries log=$real/server.log
  if running; then
    for tries in $(seq 60); do if ready; then return; fi; sleep 1; done
    die "The server in $real does not become ready; see $log"
  fi
  pid=$(head -n 1 "$real/postmaster.pid" 2>/dev/null) || pid=
  # Left by a crash, and its number has since gone to another program: the server would take that for itself.
  if [ -n "$pid" ] && [ -d "/proc/$pid" ]; then rm -f "$real/postmaster.pid"; fi
  if listening "$(port)"; then
    say "port $(port) is taken by another program, choosing a new one"
    sed -i "s/^port = .*/port = $(free_port)/" "$real/postgresql.conf"
  fi
  : >"$log" 2>/dev/null || true
  if is_root; then chown "$user:" "$log" "$real/postgresql.conf"; fi
  for tries in 1 2 3 4 5; do
    # Without the redirections the server keeps the pipe of a surrounding $(…) open, and that never ends.
    if as_server "$pg/pg_ctl" -D "$real" -l "$log" -s -w -t 60 start </dev/null >/dev/null 2>&1 9>&-; then return; fi
    grep -q 'pre-existing shared memory block' "$log" || break # children of a killed server, about to end
    sleep "$tries"
  done
  why 'PostgreSQL' "$log"
}

stop_server() {
  running || return 0
  as_server "$pg/pg_ctl" -D "$real" -s -m fast -w -t 60 stop </dev/null >/dev/null 2>&1 || die "The server in $real did not stop."
}

# ---- making and deleting ------------------------------------------------------------------------------------------

install_server() {
  if pg=$(bin); then return; fi
  if has_cluster; then die "$cluster was made by PostgreSQL $(cat "$real/PG_VERSION"), which is not installed: apt-get install postgresql-$(cat "$real/PG_VERSION")"; fi
  "$here/scripts/lib/apt-install.sh" database postgresql
  pg=$(bin) || die 'The package postgresql brought no server under /usr/lib/postgresql.'
}

# Under a home that only its owner may enter, user postgres cannot reach .data: then the cluster lies under /var/lib.
place_new_cluster() {
  if [ -L "$cluster" ]; then rm -f "$cluster"; fi
  real=$cluster
  is_root || return 0
  install -d -o "$user" -m 700 "$real.new"
  if as_server test -w "$real.new"; then return; fi
  rmdir "$real.new"
  real=/var/lib/jamnut/$(printf %s "$cluster" | sha256sum | cut -c 1-12)
  install -d -m 711 /var/lib/jamnut
  if has_cluster; then # of an earlier clone in this place, deleted since together with its passwords
    pg=$(bin) && stop_server
    mv "$real" "$real.$(date +%Y%m%d-%H%M%S)"
    say "set aside the database of an earlier clone: $(ls -d "$real".2* | tail -n 1)"
  fi
}

make_cluster() {
  local log who
  mkdir -p "$secrets"
  chmod 711 "$data"
  need_space "$data"
  place_new_cluster
  need_space "$(dirname "$real")"
  say "making a private cluster in $cluster"
  new=$real.new
  rm -rf "$new"
  for who in admin owner web; do head -c 24 /dev/urandom | base64 | tr '+/' '-_' >"$secrets/pg-$who" || die "The disk is full: $secrets"; done
  work=$(mktemp -d)
  log=$work/initdb.log
  cp "$secrets/pg-admin" "$work/password" # initdb reads it itself, so it has to be a real file that its user may read
  if is_root; then chown -R "$user:" "$work"; install -d -o "$user" -m 700 "$new"; fi
  as_server "$pg/initdb" -D "$new" -U jamnut_admin --pwfile="$work/password" --auth=scram-sha-256 --encoding=UTF8 \
    --locale=C.UTF-8 --data-checksums ${JAMNUT_PG_THROWAWAY:+--no-sync} >"$log" 2>&1 </dev/null || why initdb "$log"
  cat >>"$new/postgresql.conf" <<CONF

# Jamnut
listen_addresses = '127.0.0.1'
port = $(free_port)
unix_socket_directories = ''
timezone = 'UTC'
log_timezone = 'UTC'
${JAMNUT_PG_THROWAWAY:+fsync = off}
CONF
  printf '%s\n' "$cluster" >"$new/jamnut"
  mv "$new" "$real"
  if [ "$real" != "$cluster" ]; then ln -s "$real" "$cluster"; fi
}

# Two roles: the owner of everything, for migrations, and the web server's, which owns nothing and makes nothing.
make_roles() {
  as_admin -d postgres <<SQL
select 'create role jamnut_owner' where not exists (select from pg_roles where rolname = 'jamnut_owner') \gexec
select 'create role jamnut_web' where not exists (select from pg_roles where rolname = 'jamnut_web') \gexec
alter role jamnut_owner login nosuperuser nocreatedb nocreaterole password '$(secret owner)';
alter role jamnut_web login nosuperuser nocreatedb nocreaterole password '$(secret web)';
revoke all on database postgres, template1 from public;
SQL
}

make_database() { # $1 name; one that is there already is deleted
  as_admin -d postgres -c 'set client_min_messages = error' -c "drop database if exists $1 with (force)" \
    -c "create database $1 owner jamnut_owner"
  as_admin -d "$1" <<SQL
revoke all on database $1 from public;
grant connect on database $1 to jamnut_web;
alter schema public owner to jamnut_owner;
revoke create on schema public from public;
SQL
}

start() {
  if has_cluster; then check_ours; else make_cluster; fi
  start_server
  if [ ! -e "$real/jamnut-ready" ]; then
    make_roles
    make_database jamnut
    : >"$real/jamnut-ready"
  fi
  say "running on 127.0.0.1:$(port)"
}

check_ours() { [ -e "$real/jamnut" ] || die "$cluster is not a cluster of Jamnut: left alone."; }

drop() {
  local home port
  if [ -n "${DATABASE_URL:-}" ] && { ! has_cluster || [[ $DATABASE_URL != *@127.0.0.1:$(port)/* ]]; }; then
    die 'DATABASE_URL names another server than the one of this folder: nothing deleted.'
  fi
  has_cluster || return 0
  check_ours
  home=$(cat "$real/jamnut")
  if [ "$home" != "$cluster" ] && [ "$(realpath -m -- "$home")" = "$real" ]; then
    die "$cluster only links to the database of $home: nothing deleted."
  fi
  if ! running && listening "$(port)"; then
    die "Another server than ours answers on port $(port): nothing deleted. './docker-free-pg.sh start' moves ours to a free port."
  fi
  stop_server
  rm -rf "$real"
  rm -rf "$cluster" "$secrets"/pg-*
  real=$cluster
}

# ---- the verbs ----------------------------------------------------------------------------------------------------

work='' new=''
trap 'rm -rf "$work" "$new"' EXIT
trap 'exit 130' INT # after the step at hand: nothing is left half made
trap 'exit 143' TERM
check_owner
if ! has_cluster; then
  case $verb in
    status) say "there is none in $cluster"; exit 4 ;;
    stop) say 'not running'; exit 0 ;;
    url | psql) die "There is none yet: './docker-free-pg.sh start' makes it." ;;
  esac
fi
case $verb in
  url) url "$role"; exit ;;
  status) if running; then say "running on 127.0.0.1:$(port), in $real"; exit; else say "stopped, in $real"; exit 3; fi ;;
esac
mkdir -p "$data" 2>/dev/null || die "Cannot write to $data."
install_server
if [ "$verb" = psql ]; then
  running || die "Not running: './docker-free-pg.sh start' starts it."
  PGPASSWORD=$(secret "$role") exec "$pg/psql" -h 127.0.0.1 -p "$(port)" -U "jamnut_$role" jamnut
fi
exec 9>"$data/pg.lock" # one at a time
flock -w 120 9 || die "Another docker-free-pg.sh is busy in $data."
case $verb in
  start) start ;;
  stop) if running; then stop_server; say 'stopped'; else say 'not running'; fi ;;
  drop) drop; say 'deleted' ;;
  reset) drop; user=$(server_user); install_server; start ;;
  database)
    start >/dev/null
    make_database "$name"
    ;;
esac
