# shellcheck shell=bash
# Words to the user, and the helpers every script needs. Sourced, never run.

PROGRAM=${PROGRAM:-$(basename "$0")}
REPO=$(cd "$(dirname "${BASH_SOURCE[0]}")/../.." && pwd)
export DOTNET_NOLOGO=1 DOTNET_CLI_TELEMETRY_OPTOUT=1 DOTNET_GENERATE_ASPNET_CERTIFICATE=false
# Build servers outlive the command that started them; without them nothing is left behind when a script is interrupted.
export MSBUILDDISABLENODEREUSE=1 DOTNET_CLI_USE_MSBUILD_SERVER=0 UseSharedCompilation=false UseRazorBuildServer=false

say()  { printf '%s\n' "$*"; }
warn() { printf '%s: %s\n' "$PROGRAM" "$*" >&2; }
die()  { warn "$*"; exit 1; }
have() { command -v "$1" >/dev/null 2>&1; }
is_root() { [[ $EUID -eq 0 ]]; }

# Twenty-four random bytes in characters that need no quoting in SQL, in a shell or in a connection string.
random_password() { head -c 24 /dev/urandom | base64 -w0 | tr '+/' '-_'; }

# Something listens on 127.0.0.1:$1.
port_in_use() { (exec 3<>"/dev/tcp/127.0.0.1/$1") 2>/dev/null; }

# A port nobody listens on, below the range the kernel hands out to outgoing connections.
free_port() {
    local port
    for _ in {1..200}; do
        port=$((20000 + (RANDOM * 32768 + RANDOM) % 12000))
        if ! port_in_use "$port"; then printf '%s\n' "$port"; return; fi
    done
    return 1
}

free_megabytes() { df -Pk -- "$1" | awk 'NR == 2 { print int($4 / 1024) }'; }

require_space() { # FOLDER MEGABYTES
    local free
    free=$(free_megabytes "$1")
    ((free >= $2)) || die "only $free MB free in $1; at least $2 MB are needed there"
}

require_dotnet() {
    have dotnet || die "the .NET SDK is missing: install .NET SDK 10 (package dotnet-sdk-10.0) and start again"
    (cd "$REPO" && dotnet --version >/dev/null 2>&1) ||
        die "no .NET SDK that fits global.json: install .NET SDK 10 (package dotnet-sdk-10.0) and start again"
    # The SDK wants a place for its caches even where a service account has no home.
    if [[ -z ${HOME:-} || ! -w ${HOME:-} ]]; then
        export DOTNET_CLI_HOME=${DOTNET_CLI_HOME:-${TMPDIR:-/tmp}/pathportal-dotnet-$EUID}
        export NUGET_PACKAGES=${NUGET_PACKAGES:-$DOTNET_CLI_HOME/packages}
        mkdir -p "$DOTNET_CLI_HOME"
    fi
}
