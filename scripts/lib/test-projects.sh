# shellcheck shell=bash
# Running the test projects side by side and adding up their reports. Sourced by scripts/test only.

passed=0 failed=0 skipped=0
projects=()
declare -A job_name=() job_start=()

# select_projects [NAME…]  Sets `projects`: all those under tests that have a source file, the slowest first.
select_projects() {
    local name folder
    if (($# > 0)); then
        for name in "$@"; do
            [[ -d tests/PathPortal.$name.Tests ]] || die "there is no test project tests/PathPortal.$name.Tests"
            projects+=("$name")
        done
        return
    fi
    for folder in tests/PathPortal.*.Tests; do
        name=${folder#tests/PathPortal.}
        # A project laid out for tests still to come has nothing to run.
        if [[ -n $(find "$folder" -name '*.cs' -not -path '*/obj/*' -not -path '*/bin/*' -print -quit) ]]; then
            projects+=("${name%.Tests}")
        fi
    done
}

start_job() { # NAME
    while ((${#job_name[@]} >= ${PATHPORTAL_TEST_JOBS:-2})); do finish_one; done
    local log=$RESULTS/$1.log
    if [[ $1 == format ]]; then
        spawn_as TERM "$log" dotnet format PathPortal.sln --verify-no-changes --no-restore --verbosity minimal
    else
        spawn_as TERM "$log" dotnet "tests/PathPortal.$1.Tests/bin/Release/net10.0/PathPortal.$1.Tests.dll" \
            -noLogo -noColor -result-trx "$RESULTS/$1.trx"
    fi
    job_name[$spawned]=$1
    job_start[$spawned]=$SECONDS
}

finish_one() {
    local pid status=0
    wait -n -p pid "${!job_name[@]}" || status=$?
    count_job "${job_name[$pid]}" "$status" "$((SECONDS - job_start[$pid]))"
    unset "job_name[$pid]" "job_start[$pid]"
}

finish_jobs() { while ((${#job_name[@]} > 0)); do finish_one; done; }

stop_jobs() {
    local pid
    for pid in "${!job_name[@]}"; do stop_child "$pid" TERM 10; done
}

counter() { # NAME COUNTERS
    local number
    number=$(sed -nE "s/.* $1=\"([0-9]+)\".*/\1/p" <<<"$2")
    printf '%s\n' "${number:-0}"
}

count_job() { # NAME STATUS SECONDS
    local name=$1 status=$2 counters good=0 bad=0 left=0 remark=
    if [[ $name == format ]]; then
        if ((status == 0)); then good=1; else bad=1; fi
    else
        counters=$(grep -m1 -o '<Counters [^>]*>' "$RESULTS/$name.trx" 2>/dev/null || :)
        good=$(counter passed "$counters")
        left=$(($(counter total "$counters") - good - $(counter failed "$counters")))
        bad=$(counter failed "$counters")
        # A project that ends badly without a failed test in its report has crashed, and one without a test proves nothing.
        if ((good + bad == 0)); then remark=' (no test ran)'; elif ((status != 0 && bad == 0)); then remark=" (exit code $status)"; fi
        if [[ -n $remark ]]; then bad=$((bad + 1)); fi
    fi
    passed=$((passed + good)) failed=$((failed + bad)) skipped=$((skipped + left))
    printf '%-10s %5d passed %4d failed %4d skipped %5d s%s\n' "$name" "$good" "$bad" "$left" "$3" "$remark"
    if ((bad > 0)); then
        sed 's/^/    /' "$RESULTS/$name.log" | tail -n 120
    elif ((left > 0)); then
        grep -A1 -F ' [SKIP]' "$RESULTS/$name.log" || :
    fi
}
