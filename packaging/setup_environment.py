"""The environment in ``.venv``: made once from the locked versions, and left alone while they stay the same.

The file also parses on Python 3.9, since an older Python has to be able to say that it is too old.
"""

from __future__ import annotations

import contextlib
import hashlib
import os
import shutil
import subprocess
import sys
from collections.abc import Callable, Iterator
from pathlib import Path

from system_needs import OLDEST_PYTHON, SetUpError

ROOT = Path(__file__).resolve().parent.parent
FOLDER = ROOT / ".venv"
TO_RUN = ROOT / "packaging" / "locked.txt"
TO_TEST = ROOT / "packaging" / "locked-with-tests.txt"  # holds every line of the other one


def python_of(folder: Path) -> Path:
    """The interpreter of an environment."""
    return folder / "Scripts" / "python.exe" if os.name == "nt" else folder / "bin" / "python"


def is_ready(lock: Path, folder: Path = FOLDER) -> bool:
    """Whether the environment was made from this lock as it is now."""
    try:
        stamped = _stamp(folder).read_text(encoding="ascii").split()
    except OSError:
        return False
    return _digest(lock) in stamped and python_of(folder).exists()


def make_ready(lock: Path, say: Callable[[str], None], folder: Path = FOLDER) -> None:
    """Make the environment, or bring it to the locked versions; what fails leaves nothing half-made."""
    with _removed_on_failure(folder):
        if not _usable(folder):
            say("Making an environment in %s" % folder)
            _create(folder)
        _stamp(folder).unlink(missing_ok=True)
        say("Installing the libraries that are locked in %s (once; this can take a minute or two)" % lock.name)
        _install(lock, folder)
        _link_source(folder)
    installed = [TO_TEST, TO_RUN] if lock == TO_TEST else [lock]
    _stamp(folder).write_text("\n".join(map(_digest, installed)) + "\n", encoding="ascii")


def pip_sentence(output: str) -> str:
    """What pip's output means, in one sentence."""
    for sentence, signs in _SIGNS:
        if any(sign in output for sign in signs):
            return sentence
    errors = [line[len("ERROR: ") :] for line in output.splitlines() if line.startswith("ERROR: ")]
    return "The libraries could not be installed; pip says: %s" % (errors[-1] if errors else output.strip()[-300:])


_SIGNS = (
    (
        "A downloaded library is not the one that was locked (its hash differs), so it was not installed.",
        ("DO NOT MATCH THE HASHES",),
    ),
    ("There is no room left on the disk for the libraries.", ("No space left on device",)),
    (
        "The libraries could not be downloaded: this machine seems to have no network just now.",
        (
            "NewConnectionError",
            "Failed to establish a new connection",
            "NameResolutionError",
            "Failed to resolve",
            "ConnectTimeout",
            "Connection refused",
            "ReadTimeout",
            "Cannot connect to proxy",
            "Network is unreachable",
        ),
    ),
    (
        "There is no ready-made build of a library for this system and Python %d.%d." % sys.version_info[:2],
        ("No matching distribution found",),
    ),
)


@contextlib.contextmanager
def _removed_on_failure(folder: Path) -> Iterator[None]:
    """Take a new environment away again if making it fails or is interrupted; an older one stays as it is."""
    existed = folder.exists()
    try:
        yield
    except BaseException:
        if not existed:
            shutil.rmtree(folder, ignore_errors=True)
        raise


def _usable(folder: Path) -> bool:
    """Whether an environment is there whose Python runs, is new enough and has pip."""
    if not python_of(folder).exists():
        return False
    probe = "import sys, pip; sys.exit(sys.version_info[:2] < %r)" % (OLDEST_PYTHON,)
    return _run([str(python_of(folder)), "-I", "-c", probe]).returncode == 0


def _create(folder: Path) -> None:
    made = _run([sys.executable, "-I", "-m", "venv", "--clear", str(folder)])
    if made.returncode != 0:
        raise SetUpError("The environment could not be made: %s" % (made.stdout + made.stderr).strip()[-300:])


def _install(lock: Path, folder: Path) -> None:
    """Install exactly what is locked. Few retries, so that a missing network is said in seconds."""
    pip = [str(python_of(folder)), "-I", "-m", "pip", "--no-input", "--disable-pip-version-check"]
    install = ["install", "-q", "--retries", "1", "--timeout", "15", "--only-binary", ":all:", "--require-hashes"]
    tried = _run([*pip, *install, "-r", str(lock)])
    if tried.returncode != 0:
        raise SetUpError(pip_sentence(tried.stdout + tried.stderr))


def _link_source(folder: Path) -> None:
    """Let the environment import the source tree, by a relative path: the tree may be moved, and may have any name."""
    where = _run([str(python_of(folder)), "-I", "-c", "import sysconfig; print(sysconfig.get_path('purelib'))"])
    packages = Path(where.stdout.strip())
    (packages / "fourcount-source.pth").write_text(os.path.relpath(ROOT / "appsrc", packages) + "\n", encoding="utf-8")


def _stamp(folder: Path) -> Path:
    return folder / "made-from-locks"


def _digest(lock: Path) -> str:
    return hashlib.sha256(lock.read_bytes()).hexdigest()


def _run(command: list[str]) -> subprocess.CompletedProcess[str]:
    return subprocess.run(
        command, stdin=subprocess.DEVNULL, capture_output=True, text=True, errors="replace", check=False
    )
