"""What the machine itself must bring, and how to say in one sentence what it lacks.

Everything here is looked at before anything is downloaded, so that nothing half-made is left behind.
The file also parses on Python 3.9, since an older Python has to be able to say that it is too old.
"""

from __future__ import annotations

import contextlib
import ctypes
import importlib.util
import os
import re
import shutil
import socket
import subprocess
import sys
from collections.abc import Callable, Mapping, Sequence
from typing import NamedTuple

OLDEST_PYTHON = (3, 11)


class SetUpError(Exception):
    """Its text is the one sentence for the reader."""


class Need(NamedTuple):
    """Something the machine brings: what it is called there, and the Debian package that holds it."""

    what: str
    package: str


# Found by taking packages away one by one from a minimal Debian until a window no longer opened.
PAINTING_LIBRARIES = (
    Need("libEGL.so.1", "libegl1"),
    Need("libGL.so.1", "libgl1"),
    Need("libxkbcommon.so.0", "libxkbcommon0"),
    Need("libfontconfig.so.1", "libfontconfig1"),
    Need("libdbus-1.so.3", "libdbus-1-3"),
    Need("libglib-2.0.so.0", "libglib2.0-0"),
)
X_LIBRARIES = (
    Need("libxcb-cursor.so.0", "libxcb-cursor0"),
    Need("libxcb-icccm.so.4", "libxcb-icccm4"),
    Need("libxcb-keysyms.so.1", "libxcb-keysyms1"),
    Need("libxcb-shape.so.0", "libxcb-shape0"),
    Need("libxkbcommon-x11.so.0", "libxkbcommon-x11-0"),
)
WAYLAND_LIBRARIES = (
    Need("libwayland-client.so.0", "libwayland-client0"),
    Need("libwayland-cursor.so.0", "libwayland-cursor0"),
)
# A screen in memory for the tests that need a real window, and a small window manager, without which
# no window there ever gets the keyboard or fills the screen.
TEST_COMMANDS = (
    Need("Xvfb", "xvfb"),
    Need("xvfb-run", "xvfb"),
    Need("xauth", "xauth"),
    Need("openbox", "openbox"),
)


def require_python(version: tuple[int, int, int], script: str) -> None:
    """Refuse a Python that is too old, naming a newer one where the machine has one."""
    if version[:2] >= OLDEST_PYTHON:
        return
    newer = [name for name in ("python3.%d" % minor for minor in range(19, 10, -1)) if shutil.which(name)]
    found = "%d.%d.%d" % version
    advice = "run %s %s" % (newer[0], script) if newer else "install a newer Python and run the script with it"
    raise SetUpError("Fourcount needs Python 3.11 or newer and this is Python %s: %s." % (found, advice))


def require_screen(environ: Mapping[str, str], platform: str) -> None:
    """Refuse to open a window where there is no screen; Qt would end with a misleading message."""
    if not platform.startswith("linux") or environ.get("WAYLAND_DISPLAY"):
        return
    if environ.get("QT_QPA_PLATFORM", "").split(":")[0] not in ("", "xcb", "wayland"):
        return
    display = environ.get("DISPLAY", "")
    if display and _may_answer(display):
        return
    found = "nothing answers at DISPLAY=%s" % display if display else "neither DISPLAY nor WAYLAND_DISPLAY is set"
    raise SetUpError(
        "There is no screen to open a window on (%s): "
        "start Fourcount from a desktop session, or use its command line, which needs none." % found
    )


def window_libraries(environ: Mapping[str, str], platform: str) -> tuple[Need, ...]:
    """The libraries that a window needs on the kind of screen that is there."""
    if not platform.startswith("linux"):
        return ()
    if environ.get("WAYLAND_DISPLAY") and not environ.get("DISPLAY"):
        return PAINTING_LIBRARIES + WAYLAND_LIBRARIES
    return PAINTING_LIBRARIES + X_LIBRARIES


def painting_libraries(platform: str) -> tuple[Need, ...]:
    """The libraries that painting without a window needs."""
    return PAINTING_LIBRARIES if platform.startswith("linux") else ()


def missing_libraries(libraries: Sequence[Need]) -> list[Need]:
    """Those that the system's loader does not find."""
    return [need for need in libraries if not _loads(need.what)]


def missing_commands(commands: Sequence[Need]) -> list[Need]:
    """Those that are not on the path."""
    return [need for need in commands if shutil.which(need.what) is None]


def missing_venv() -> list[Need]:
    """Python's own venv with pip, which Debian keeps in a package of its own."""
    if importlib.util.find_spec("venv") and importlib.util.find_spec("ensurepip"):
        return []
    return [Need("Python's venv module", "python%d.%d-venv" % sys.version_info[:2])]


def require(look: Callable[[], list[Need]], say: Callable[[str], None]) -> None:
    """See to it that ``look`` finds nothing missing: install it as root on Debian, else say it in one sentence."""
    missing = look()
    if not missing:
        return
    if shutil.which("apt-get") is None:
        raise SetUpError(_lacking(missing))
    packages = _packages(missing)
    if os.geteuid() != 0:
        raise SetUpError("Some system packages are missing, please run: sudo apt-get install %s" % " ".join(packages))
    say("Installing system packages: %s" % " ".join(packages))
    _apt_install(packages)
    still_missing = look()
    if still_missing:
        raise SetUpError(_lacking(still_missing))


def _may_answer(display: str) -> bool:
    """Whether an X server listens at a display of this machine; one elsewhere is given the benefit of the doubt."""
    local = re.fullmatch(r":(\d+)(\.\d+)?", display)
    if local is None:
        return True
    path = "/tmp/.X11-unix/X" + local[1]
    for address in (path, "\0" + path):
        with socket.socket(socket.AF_UNIX) as client, contextlib.suppress(OSError):
            client.connect(address)
            return True
    return False


def _lacking(missing: Sequence[Need]) -> str:
    names = ", ".join(need.what for need in missing)
    return "This machine lacks %s: install what holds it in your system, then run this again." % names


def _packages(missing: Sequence[Need]) -> list[str]:
    return sorted({need.package for need in missing})


def _loads(library: str) -> bool:
    try:
        ctypes.CDLL(library)
    except OSError:
        return False
    return True


def _apt_install(packages: Sequence[str]) -> None:
    """Install from the lists of packages as they are, and fetch those only if that fails."""
    install = ["apt-get", "install", "-y", "-qq", "--no-install-recommends", *packages]
    if _quietly(install).returncode == 0:
        return
    _quietly(["apt-get", "update", "-qq"])
    tried = _quietly(install)
    if tried.returncode != 0:
        lines = [line for line in tried.stderr.splitlines() if line.startswith("E:")] or ["no reason given"]
        raise SetUpError("apt-get could not install %s: %s" % (" ".join(packages), lines[0]))


def _quietly(command: Sequence[str]) -> subprocess.CompletedProcess[str]:
    environ = {**os.environ, "DEBIAN_FRONTEND": "noninteractive", "LC_ALL": "C.UTF-8"}
    return subprocess.run(
        command, env=environ, stdin=subprocess.DEVNULL, capture_output=True, text=True, errors="replace", check=False
    )
