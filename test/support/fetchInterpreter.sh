#!/bin/sh
# Unpacks Debian's stand-alone RS-274/NGC interpreter (package linuxcnc-uspace), with the libraries it
# links to that are not installed, into a folder of its own, as an outside judge of our G-code. Nothing
# is installed. Where it goes: $FEWLIFT_TOOLS, else ~/.cache/fewlift-tools. Does nothing the second time.
set -eu
tools=${FEWLIFT_TOOLS:-$HOME/.cache/fewlift-tools}
if [ -x "$tools/rs274" ] && "$tools/rs274" --self-test; then
  exit 0
fi
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
mkdir -p "$work/debs" "$work/root"

fetch() {
  (cd "$work/debs" && apt-get -o APT::Sandbox::User=root download "$@" >/dev/null)
}

fetch linuxcnc-uspace 2>/dev/null || { apt-get update >/dev/null && fetch linuxcnc-uspace; }
dpkg-deb -x "$work"/debs/linuxcnc-uspace_*.deb "$work/unpacked"
mkdir -p "$work/root/bin" "$work/root/lib"
cp "$work/unpacked/usr/bin/rs274" "$work/root/bin/"
find "$work/unpacked/usr/lib" -maxdepth 2 -name 'lib*.so*' -exec cp -P {} "$work/root/lib/" \;

missing() {
  LD_LIBRARY_PATH="$work/root/lib" ldd "$work/root/bin/rs274" | grep -q 'not found'
}

# Of its dependencies only the libraries it links to; the rest is for graphical programs.
if missing; then
  wanted=$(apt-cache depends linuxcnc-uspace |
    sed -n 's/^ *Depends: \(lib\(boost-python\|python3\|edit\|tirpc\)[^ ]*\)$/\1/p')
  for package in $(apt-cache depends --recurse --no-recommends --no-suggests --no-conflicts --no-breaks \
    --no-replaces --no-enhances --no-pre-depends $wanted | grep '^lib' | grep -v '^libc6' | sort -u); do
    if dpkg-query -W -f='${Status}' "$package" 2>/dev/null | grep -q '^install ok installed$'; then
      continue
    fi
    rm -f "$work"/debs/*
    fetch "$package" 2>/dev/null || continue
    dpkg-deb -x "$work"/debs/*.deb "$work/unpacked"
  done
  find "$work/unpacked/usr/lib" "$work/unpacked/lib" -name 'lib*.so*' -exec cp -P {} "$work/root/lib/" \; \
    2>/dev/null || true
fi
if missing; then
  echo "libraries of the interpreter are missing:" >&2
  LD_LIBRARY_PATH="$work/root/lib" ldd "$work/root/bin/rs274" | grep 'not found' >&2
  exit 1
fi
# The interpreter starts a Python; where none is installed it needs the unpacked one's library.
python=$(ls -d "$work"/unpacked/usr/lib/python3.* 2>/dev/null | head -1 || true)
if [ -n "$python" ] && [ ! -d "/usr/lib/$(basename "$python")" ]; then
  mkdir -p "$work/root/home/lib"
  cp -a "$python" "$work/root/home/lib/"
fi

cat >"$work/root/rs274" <<'WRAPPER'
#!/bin/sh
# rs274 FILE: canonical commands on standard output; errors on standard error, with exit code 1.
here=$(dirname "$(readlink -f "$0")")
export LD_LIBRARY_PATH="$here/lib"
[ -d "$here/home" ] && export PYTHONHOME="$here/home"
if [ "${1:-}" = --self-test ]; then
  printf 'G21\nG0 X1\nM2\n' >"$here/self-test.ngc"
  set -- "$here/self-test.ngc"
  exec "$here/bin/rs274" -g -t "$here/tools.tbl" "$1" </dev/null >/dev/null 2>&1
fi
exec "$here/bin/rs274" -g -t "$here/tools.tbl" "$1" </dev/null
WRAPPER
chmod +x "$work/root/rs274"
: >"$work/root/tools.tbl"
"$work/root/rs274" --self-test || { echo 'the interpreter does not run' >&2; exit 1; }
mkdir -p "$tools"
cp -a "$work/root/." "$tools/"
