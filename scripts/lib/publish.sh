# shellcheck shell=bash
# Release builds of web, worker and command line under artifacts/run, one folder per state of the sources. Sourced, never run.
# Needs common.sh and processes.sh.

PUBLISH_ROOT=$REPO/artifacts/run

# Everything that goes into a build, by content: a changed time stamp alone rebuilds nothing.
source_digest() {
    (cd "$REPO" && {
        dotnet --version
        find src migrations .editorconfig Directory.*.props global.json PathPortal.sln scripts/lib/run.slnf -type f \
            -not -path '*/bin/*' -not -path '*/obj/*' -print0 | sort -z | xargs -0 sha256sum
    } | sha256sum | cut -c1-16)
}

# publish_portal LOG  Sets `published` and holds the folder (descriptor 8) against being cleaned away by a later build.
publish_portal() {
    local log=$1 folder
    if ! mkdir -p "$PUBLISH_ROOT" 2>/dev/null || [[ ! -w $PUBLISH_ROOT ]]; then
        die "the build goes to $PUBLISH_ROOT, which $(id -un) may not write to; use a clone of your own"
    fi
    exec 7>"$PUBLISH_ROOT/.lock"
    flock -n 7 || { say "Waiting for another build of this clone"; flock 7; }
    published=$PUBLISH_ROOT/$(source_digest)
    if [[ ! -f $published/complete ]]; then
        require_space "$REPO" 1500
        say "Building (a minute or two the first time)"
        rm -rf -- "$published"
        if ! run_step "$log" dotnet publish "$REPO/scripts/lib/run.slnf" -c Release --nologo -v quiet \
            -p:PathPortalPublishRoot="$published/"; then
            grep -E 'error|No space left' "$log" | sort -u | head -n 5 >&2 || :
            die "the build failed; see $log"
        fi
        : >"$published/complete"
    fi
    exec 8>"$published/.in-use"
    flock -s 8
    for folder in "$PUBLISH_ROOT"/*/; do
        folder=${folder%/}
        [[ $folder == "$published" ]] || flock -n "$folder/.in-use" rm -rf -- "$folder" 2>/dev/null || :
    done
    exec 7>&-
}
