"""What start and check say when a machine lacks something: one sentence each, before anything is downloaded."""

from __future__ import annotations

import ast
import importlib
import sys
from collections.abc import Callable, Iterator
from pathlib import Path
from types import ModuleType
from typing import Any

import pytest

PACKAGING = Path(__file__).resolve().parents[2] / "packaging"
SCREEN = {"DISPLAY": ":0"}


@pytest.fixture(autouse=True)
def scripts() -> Iterator[dict[str, ModuleType]]:
    """The modules of packaging, fresh, as a script there would import them."""
    names = ("system_needs", "setup_environment", "start", "check")
    with pytest.MonkeyPatch.context() as patch:
        patch.syspath_prepend(PACKAGING)
        yield {name: importlib.import_module(name) for name in names}
    for name in names:
        del sys.modules[name]


@pytest.fixture
def needs(scripts: dict[str, ModuleType]) -> ModuleType:
    return scripts["system_needs"]


@pytest.fixture
def setup(scripts: dict[str, ModuleType]) -> ModuleType:
    return scripts["setup_environment"]


@pytest.fixture
def fresh_machine(
    needs: ModuleType, setup: ModuleType, monkeypatch: pytest.MonkeyPatch, tmp_path: Path
) -> Callable[..., None]:
    """A Linux machine without an environment; nothing on it may be installed or made."""

    def never(*_: object) -> None:
        raise AssertionError("something was made on a machine that lacks what it needs")

    def arrange(*, lacks: tuple[str, ...] = (), apt: bool = True, user: int = 1000) -> None:
        monkeypatch.setattr(sys, "platform", "linux")
        monkeypatch.setattr(setup, "FOLDER", tmp_path / "environment")
        monkeypatch.setattr(setup, "is_ready", lambda lock: False)
        monkeypatch.setattr(setup, "make_ready", never)
        monkeypatch.setattr(needs, "_apt_install", never)
        monkeypatch.setattr(needs, "_may_answer", lambda display: display == ":0")
        monkeypatch.setattr(needs, "_loads", lambda library: library not in lacks)
        monkeypatch.setattr(needs.importlib.util, "find_spec", lambda name: None if name in lacks else object())
        there = {"Xvfb", "xvfb-run", "xauth", "openbox"} | ({"apt-get"} if apt else set())
        monkeypatch.setattr(needs.shutil, "which", lambda name: name if name in there - set(lacks) else None)
        monkeypatch.setattr(needs.os, "geteuid", lambda: user)
        monkeypatch.setenv("DISPLAY", ":0")

    return arrange


def is_one_sentence(text: str) -> bool:
    return "\n" not in text.strip() and ". " not in text and text[0].isupper()


@pytest.mark.parametrize("file", sorted(PACKAGING.glob("*.py")), ids=lambda file: file.name)
def test_an_older_python_can_read_the_scripts(file: Path) -> None:
    """Python 3.9 parses every script, so that it can say that it is too old."""
    assert ast.parse(file.read_text(encoding="utf-8"), feature_version=(3, 9)).body


def test_a_python_that_is_too_old_is_named(needs: ModuleType, monkeypatch: pytest.MonkeyPatch) -> None:
    """A Python before 3.11 is refused with its own version in the sentence."""
    monkeypatch.setattr(needs.shutil, "which", lambda name: None)
    with pytest.raises(needs.SetUpError, match=r"3\.11 or newer and this is Python 3\.9\.2: install") as refused:
        needs.require_python((3, 9, 2), "packaging/start.py")
    assert is_one_sentence(str(refused.value))


def test_a_newer_python_on_the_machine_is_pointed_to(needs: ModuleType, monkeypatch: pytest.MonkeyPatch) -> None:
    """Where another Python would do, the sentence says how to start with it."""
    monkeypatch.setattr(needs.shutil, "which", lambda name: name if name == "python3.12" else None)
    with pytest.raises(needs.SetUpError, match=r"run python3\.12 packaging/start\.py"):
        needs.require_python((3, 9, 2), "packaging/start.py")


def test_a_python_that_is_new_enough_is_taken(needs: ModuleType) -> None:
    """Python 3.11 itself will do."""
    assert needs.require_python((3, 11, 0), "packaging/start.py") is None


@pytest.mark.parametrize(
    ("lacks", "advice"),
    [
        (("ensurepip",), f"sudo apt-get install python3.{sys.version_info[1]}-venv"),
        (("libEGL.so.1",), "sudo apt-get install libegl1"),
        (("libxcb-cursor.so.0", "libGL.so.1"), "sudo apt-get install libgl1 libxcb-cursor0"),
    ],
    ids=["venv", "library", "two libraries"],
)
def test_a_plain_user_gets_the_line_to_run(
    scripts: dict[str, ModuleType],
    fresh_machine: Callable[..., None],
    capsys: pytest.CaptureFixture[str],
    lacks: tuple[str, ...],
    advice: str,
) -> None:
    """On Debian without being root, whatever is missing makes one line to run, and nothing is made."""
    fresh_machine(lacks=lacks)
    assert scripts["start"].main([]) == 1
    said = capsys.readouterr().err.strip()
    assert said.endswith(advice)
    assert is_one_sentence(said)


def test_elsewhere_the_missing_library_is_named(
    scripts: dict[str, ModuleType], fresh_machine: Callable[..., None], capsys: pytest.CaptureFixture[str]
) -> None:
    """Without apt, the sentence names what is missing and leaves the package to the reader's system."""
    fresh_machine(lacks=("libEGL.so.1", "ensurepip"), apt=False)
    assert scripts["start"].main([]) == 1
    said = capsys.readouterr().err.strip()
    assert said.startswith("This machine lacks Python's venv module, libEGL.so.1:")
    assert is_one_sentence(said)


def test_root_installs_what_is_missing_in_one_go(
    needs: ModuleType, fresh_machine: Callable[..., None], monkeypatch: pytest.MonkeyPatch
) -> None:
    """As root on Debian everything missing is installed by one call, and looked for again."""
    fresh_machine(user=0)
    installed: list[list[str]] = []
    monkeypatch.setattr(needs, "_apt_install", installed.append)
    missing = [needs.Need("libEGL.so.1", "libegl1"), needs.Need("Xvfb", "xvfb")]
    said: list[str] = []
    needs.require(lambda: [] if installed else missing, said.append)
    assert installed == [["libegl1", "xvfb"]]
    assert said == ["Installing system packages: libegl1 xvfb"]


def test_what_apt_did_not_mend_is_said(
    needs: ModuleType, fresh_machine: Callable[..., None], monkeypatch: pytest.MonkeyPatch
) -> None:
    """A library that is still missing after the installation is named, and not installed over and over."""
    fresh_machine(user=0)
    monkeypatch.setattr(needs, "_apt_install", lambda packages: None)
    with pytest.raises(needs.SetUpError, match=r"lacks libEGL\.so\.1"):
        needs.require(lambda: [needs.Need("libEGL.so.1", "libegl1")], lambda line: None)


@pytest.mark.parametrize(
    ("display", "says"), [("", "neither DISPLAY nor WAYLAND_DISPLAY is set"), (":7", "nothing answers at DISPLAY=:7")]
)
def test_no_screen_is_said_before_all_else(
    scripts: dict[str, ModuleType],
    fresh_machine: Callable[..., None],
    monkeypatch: pytest.MonkeyPatch,
    capsys: pytest.CaptureFixture[str],
    display: str,
    says: str,
) -> None:
    """Without a screen no window is tried, since Qt would blame a library for it."""
    fresh_machine()
    for name in ("WAYLAND_DISPLAY", "QT_QPA_PLATFORM"):
        monkeypatch.delenv(name, raising=False)
    monkeypatch.setenv("DISPLAY", display)
    assert scripts["start"].main([]) == 1
    said = capsys.readouterr().err.strip()
    assert "no screen" in said
    assert says in said
    assert is_one_sentence(said)


@pytest.mark.parametrize("environ", [SCREEN, {"WAYLAND_DISPLAY": "wayland-0"}, {"QT_QPA_PLATFORM": "offscreen"}])
def test_a_screen_of_any_kind_will_do(
    needs: ModuleType, monkeypatch: pytest.MonkeyPatch, environ: dict[str, str]
) -> None:
    """X, Wayland and Qt's own platforms without a screen are all accepted."""
    monkeypatch.setattr(needs, "_may_answer", lambda display: display == ":0")
    assert needs.require_screen(environ, "linux") is None


def test_figures_need_no_screen_and_no_library(scripts: dict[str, ModuleType]) -> None:
    """The command that prints figures asks neither for a screen nor for a library of Qt's."""
    start = scripts["start"]
    assert not start._opens_window(["answer", "15", "85", "5", "95"])
    assert start._libraries(["answer", "15", "85", "5", "95"]) == ()
    assert start._opens_window(["paper.fourcount"])


def test_check_names_the_screen_in_memory(
    scripts: dict[str, ModuleType], fresh_machine: Callable[..., None], capsys: pytest.CaptureFixture[str]
) -> None:
    """Where the tests' screen and window manager are missing, check says so at once."""
    fresh_machine(lacks=("Xvfb", "xvfb-run", "openbox"))
    assert scripts["check"].main() == 1
    assert capsys.readouterr().out.strip().endswith("sudo apt-get install openbox xvfb")


@pytest.mark.parametrize(
    ("output", "says"),
    [
        ("WARNING: Retrying after connection broken by 'NewConnectionError(...)'\nERROR: No matching x", "no network"),
        (
            "ERROR: Failed to resolve 'somewhere' ([Errno -3])\nERROR: No matching distribution found for y",
            "no network",
        ),
        ("ERROR: THESE PACKAGES DO NOT MATCH THE HASHES FROM THE REQUIREMENTS FILE.", "hash differs"),
        ("ERROR: Could not install packages due to an OSError: [Errno 28] No space left on device", "no room"),
        ("ERROR: No matching distribution found for numpy==2.4.6", "no ready-made build"),
        ("WARNING: this\nERROR: something else", "pip says: something else"),
    ],
    ids=["no connection", "no name", "hash", "disk", "no build", "other"],
)
def test_a_failed_download_is_one_sentence(setup: ModuleType, output: str, says: str) -> None:
    """Whatever pip prints becomes one sentence."""
    said = setup.pip_sentence(output)
    assert says in said
    assert is_one_sentence(said)


def test_a_failed_installation_leaves_nothing(
    setup: ModuleType, monkeypatch: pytest.MonkeyPatch, tmp_path: Path
) -> None:
    """An environment whose libraries could not be installed is taken away again."""

    def fail(*_: object) -> None:
        raise setup.SetUpError("No.")

    folder = tmp_path / "environment"
    monkeypatch.setattr(setup, "_create", lambda folder: folder.mkdir())
    monkeypatch.setattr(setup, "_install", fail)
    with pytest.raises(setup.SetUpError):
        setup.make_ready(setup.TO_RUN, lambda line: None, folder)
    assert not folder.exists()


@pytest.fixture
def made(setup: ModuleType, monkeypatch: pytest.MonkeyPatch, tmp_path: Path) -> Callable[[Path], Path]:
    """Make an environment from a lock without pip."""
    folder = tmp_path / "environment"

    def create(folder: Path) -> None:
        python = setup.python_of(folder)
        python.parent.mkdir(parents=True)
        python.touch()

    monkeypatch.setattr(setup, "_create", create)
    monkeypatch.setattr(setup, "_install", lambda lock, folder: None)
    monkeypatch.setattr(setup, "_link_source", lambda folder: None)

    def make(lock: Path) -> Path:
        setup.make_ready(lock, lambda line: None, folder)
        return folder

    return make


def test_a_second_start_makes_nothing(setup: ModuleType, made: Callable[[Path], Path]) -> None:
    """An environment stays ready as long as its lock stays the same."""
    folder = made(setup.TO_RUN)
    assert setup.is_ready(setup.TO_RUN, folder)
    assert not setup.is_ready(setup.TO_TEST, folder)


def test_an_environment_for_the_tests_starts_the_program(setup: ModuleType, made: Callable[[Path], Path]) -> None:
    """What was installed for check is enough for start."""
    folder = made(setup.TO_TEST)
    assert setup.is_ready(setup.TO_TEST, folder)
    assert setup.is_ready(setup.TO_RUN, folder)


def test_a_changed_lock_is_noticed(setup: ModuleType, made: Callable[[Path], Path], tmp_path: Path) -> None:
    """A lock that changed since makes the environment stale."""
    lock = tmp_path / "lock.txt"
    lock.write_text("numpy==2.4.6\n", encoding="ascii")
    folder = made(lock)
    assert setup.is_ready(lock, folder)
    lock.write_text("numpy==2.4.7\n", encoding="ascii")
    assert not setup.is_ready(lock, folder)


def test_an_environment_whose_python_is_gone_is_stale(setup: ModuleType, made: Callable[[Path], Path]) -> None:
    """An environment whose interpreter was removed is made anew."""
    folder = made(setup.TO_RUN)
    setup.python_of(folder).unlink()
    assert not setup.is_ready(setup.TO_RUN, folder)


@pytest.mark.parametrize(
    ("line", "counts"),
    [
        ("12 passed in 0.50s", {"passed": 12}),
        (
            "1 failed, 3 passed, 2 skipped, 1 error in 61.00s (0:01:01)",
            {"failed": 1, "passed": 3, "skipped": 2, "error": 1},
        ),
        ("2 errors in 0.10s", {"error": 2}),
        ("Segmentation fault", {}),
    ],
)
def test_the_test_runner_is_understood(scripts: dict[str, ModuleType], line: str, counts: dict[str, Any]) -> None:
    """The closing line of a run of tests gives its counts."""
    assert scripts["check"].counted(["....", line]) == counts
