# shellcheck shell=bash
# The folder that holds the private database, its passwords and the logs between starts. Sourced by scripts/run only.
# Needs common.sh and postgres.sh.

default_data_folder() {
    if is_root; then printf '/var/lib/pathportal\n'; else printf '%s/pathportal\n' "${XDG_DATA_HOME:-${HOME:?}/.local/share}"; fi
}

# open_data_folder FOLDER  Makes the folder where it is missing, sees that it will do, and holds it (descriptor 9).
open_data_folder() {
    local folder=$1
    if ! mkdir -p -- "$folder" "$folder/log" "$folder/secrets" "$folder/keys" 2>/dev/null || ! : 2>/dev/null >"$folder/lock"; then
        if [[ -d $folder ]]; then require_space "$folder" 1; fi
        die "$(id -un) can't write to the data folder $folder; set PATHPORTAL_DATA to a folder where this is possible"
    fi
    exec 9>"$folder/lock"
    # A start right after a kill meets the last steps of the old one.
    flock -w 10 9 || die "another scripts/run is using the data folder $folder"
    chmod 700 "$folder/log" "$folder/secrets" "$folder/keys"
    require_space "$folder" 300
    if is_root; then
        chmod 755 "$folder"
        as_pg test -x "$folder" || die "PostgreSQL can't run as root and the account nobody can't reach $folder; set PATHPORTAL_DATA to a folder under /var/lib or /srv"
    fi
}

# keep_log NAME  Prints the path of a fresh log file; the one of the previous start stays beside it.
keep_log() {
    local log=$DATA/log/$1.log
    if [[ -s $log ]]; then mv -f -- "$log" "$log.1"; fi
    : >"$log"
    printf '%s\n' "$log"
}

# secret NAME  Prints the password kept under that name, made up at its first use.
secret() {
    local file=$DATA/secrets/$1
    if [[ ! -s $file ]]; then (umask 077; random_password >"$file.new"; mv -- "$file.new" "$file"); fi
    cat -- "$file"
}

# find_private_server  Sees that the server is there which the cluster needs, before the long work begins.
find_private_server() {
    local version=''
    # shellcheck disable=SC2034 # read by postgres.sh
    PG_NPM_FOLDER=$DATA/npm
    if [[ -d $DATA/postgres ]]; then version=$(as_pg cat "$DATA/postgres/PG_VERSION"); fi
    pg_require "$(keep_log packages)" "$version"
}

# start_private_database LOG  Makes the cluster at the first start, starts it, and sets owner_db, web_db and worker_db.
start_private_database() {
    local log=$1 cluster=$DATA/postgres port try
    mkdir -p "$DATA/socket"
    if is_root; then chown nobody "$DATA/socket"; fi
    chmod 700 "$DATA/socket"
    if [[ ! -d $cluster ]]; then
        say "Making a private database in $DATA"
        # shellcheck disable=SC2034 # read by postgres.sh
        pg_superuser_password=$(secret superuser)
        # The owner makes the two other roles, so it may create roles; it is no superuser.
        pg_init "$cluster" "$log" "CREATE ROLE pathportal_owner LOGIN CREATEROLE PASSWORD '$(secret owner)';
CREATE DATABASE pathportal OWNER pathportal_owner;" || database_failed "$log" "could not be made"
    fi
    # Another program may have taken the port between the look and the start.
    for try in 1 2 3; do
        port=$(free_port) || die "no free port on 127.0.0.1"
        if pg_start "$cluster" "$log" "$port" "$DATA/socket"; then break; fi
        if ((try == 3)) || ! tail -n 5 "$log" | grep -q 'could not bind'; then database_failed "$log" "did not start"; fi
    done
    owner_db=$(connection_string "$port" pathportal pathportal_owner "$(secret owner)")
    web_db=$(connection_string "$port" pathportal pathportal_web "$(secret web)")
    worker_db=$(connection_string "$port" pathportal pathportal_worker "$(secret worker)")
}

database_failed() { # LOG WHAT
    if grep -q 'No space left' "$1"; then die "the disk is full: PostgreSQL needs room in $DATA"; fi
    die "the private database $2; see $1"
}
