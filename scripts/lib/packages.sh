# shellcheck shell=bash
# Debian and Ubuntu packages, through the ordinary client. Sourced, never run.

as_root=()
if ! is_root; then as_root=(sudo -n); fi

can_install() { have apt-get && { is_root || { have sudo && sudo -n true 2>/dev/null; }; }; }

# apt_install LOG PACKAGE…
apt_install() {
    local log=$1
    shift
    local apt=("${as_root[@]}" env DEBIAN_FRONTEND=noninteractive apt-get -q -o DPkg::Lock::Timeout=120)
    { "${apt[@]}" install -y --no-install-recommends "$@" ||
        { "${apt[@]}" update && "${apt[@]}" install -y --no-install-recommends "$@"; }; } >>"$log" 2>&1 </dev/null
}

# The server package would create and start a cluster of its own; nobody asked for one.
install_postgresql() { # LOG
    local settings=/etc/postgresql-common/createcluster.d
    "${as_root[@]}" mkdir -p "$settings" &&
        printf 'create_main_cluster = false\n' | "${as_root[@]}" tee "$settings/pathportal.conf" >/dev/null &&
        apt_install "$1" postgresql
}

find_chromium() {
    local name
    for name in "${PATHPORTAL_CHROMIUM:-}" chromium chromium-browser google-chrome-stable google-chrome; do
        # Ubuntu's chromium-browser may be only a hint to install something else; a browser says its version.
        if [[ -n $name ]] && have "$name" && "$name" --version >/dev/null 2>&1; then command -v "$name"; return; fi
    done
    return 1
}

# require_chromium LOG  Sets and exports PATHPORTAL_CHROMIUM.
require_chromium() {
    local found
    if ! found=$(find_chromium) && can_install; then
        say "Installing Chromium"
        apt_install "$1" chromium || true
    fi
    found=$(find_chromium) || die "Chromium is missing: install the package chromium and start again (the attempt is logged in $1)"
    export PATHPORTAL_CHROMIUM=$found
}

# offer_compose_client LOG  For the tests of the container files, which say so when they have to do without.
offer_compose_client() {
    if have docker-compose || { have docker && docker compose version >/dev/null 2>&1; } || ! can_install; then return; fi
    say "Installing a compose client"
    local package=docker-compose
    if apt-cache show docker-compose-v2 >/dev/null 2>&1; then package=docker-compose-v2; fi
    apt_install "$1" "$package" || :
}
