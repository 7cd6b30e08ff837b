# shellcheck shell=bash
# Child processes that never outlive the script. Sourced, never run.
#
# Each child leads a session of its own: a terminal's Ctrl-C reaches only the script, which then stops its children in the right
# order. Each child also asks the kernel for a signal when the script dies, so that even kill -9 of the script leaves nothing.

# spawn_as DEATH_SIGNAL LOG COMMAND…  Starts the command and sets `spawned` to its process id. The caller may define `as_user`,
# an array of further setpriv options.
spawn_as() {
    local signal=$1 log=$2
    shift 2
    setsid setpriv "${as_user[@]}" --pdeathsig "$signal" -- "$@" >>"$log" 2>&1 </dev/null 9>&- 8>&- &
    spawned=$!
}
as_user=()

alive() { kill -0 "$1" 2>/dev/null; }

# signal_and_wait PID SIGNAL SECONDS  False when the child is still there afterwards.
signal_and_wait() {
    local pid=$1 signal=$2 deadline=$((SECONDS + $3))
    kill "-$signal" "$pid" 2>/dev/null || :
    while alive "$pid"; do
        ((SECONDS < deadline)) || return 1
        sleep 0.05
    done
}

# stop_child PID SIGNAL SECONDS  Asks politely, then kills whatever is left of its session.
stop_child() {
    signal_and_wait "$@" || :
    kill -KILL -- "-$1" 2>/dev/null || :
    wait "$1" 2>/dev/null || :
}

# run_step LOG COMMAND…  Runs one finite command so that a signal to the script is acted on at once instead of after the command.
step_pid=
run_step() {
    local log=$1 status=0
    shift
    spawn_as TERM "$log" "$@"
    step_pid=$spawned
    wait "$step_pid" || status=$?
    step_pid=
    return "$status"
}

stop_step() {
    if [[ -n $step_pid ]]; then stop_child "$step_pid" TERM 5; fi
    step_pid=
}
