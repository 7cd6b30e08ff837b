# shellcheck shell=bash
# Just enough HTTP to ask the portal how it is, for machines without a client. Sourced, never run.

# http_status PORT PATH  Prints the status code of a GET, or 000 when nobody answers within six seconds.
http_status() {
    # shellcheck disable=SC2016 # the inner shell expands them
    timeout 6 bash -c '
        exec 3<>"/dev/tcp/127.0.0.1/$1" || exit
        printf "GET %s HTTP/1.1\r\nHost: localhost\r\nConnection: close\r\n\r\n" "$2" >&3
        read -r _ status _ <&3 && printf "%s\n" "$status"' http "$1" "$2" 2>/dev/null || printf '000\n'
}
