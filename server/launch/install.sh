# Sourced from the project's folder by start.sh and test.sh: the packages as package-lock.json says, or exit.
# The installer runs in the background because a shell heeds a signal only while it waits.

stop_installing() {
  kill -TERM "$installer" 2>/dev/null
  wait "$installer"
  exit 143
}

install_packages() {
  node server/launch/installed.mjs && return
  echo 'Installing packages (once, about a minute) ...'
  npm ci --include=dev --no-audit --no-fund --loglevel=error &
  installer=$!
  trap stop_installing TERM INT HUP
  wait "$installer" || {
    echo 'The packages could not be installed; see the lines above.' >&2
    exit 1
  }
  trap - TERM INT HUP
}

# two starts at once must not install over each other; the kernel lets go of the lock when this shell ends
if command -v flock >/dev/null; then
  exec 9<package.json
  flock 9
  install_packages 9<&-
  exec 9<&-
else
  install_packages
fi
