"""The locked versions: what runs is what was tested, and both are what the project file asks for."""

from __future__ import annotations

import tomllib
from pathlib import Path

import pytest
from packaging.requirements import Requirement

ROOT = Path(__file__).resolve().parents[2]
TO_RUN = ROOT / "packaging" / "locked.txt"
TO_TEST = ROOT / "packaging" / "locked-with-tests.txt"
PROJECT = tomllib.loads((ROOT / "pyproject.toml").read_text(encoding="utf-8"))["project"]


def pins(lock: Path) -> dict[str, list[str]]:
    """Each pinned line, such as ``numpy==2.4.6 ; python_full_version < '3.12'``, with its hashes."""
    found: dict[str, list[str]] = {}
    line_of = ""
    for line in lock.read_text(encoding="ascii").splitlines():
        if line.startswith(" "):
            found[line_of].append(line.strip(" \\"))
        else:
            line_of = line.strip(" \\")
            found[line_of] = []
    return found


def versions(lock: Path, name: str) -> list[str]:
    """The versions in which a library is locked: one, or one for each range of Python versions."""
    pinned = [Requirement(line) for line in pins(lock)]
    return [next(iter(pin.specifier)).version for pin in pinned if pin.name.lower() == name.lower()]


def test_both_locks_agree() -> None:
    """Everything locked for running is locked for testing in the same version."""
    to_run, to_test = pins(TO_RUN), pins(TO_TEST)
    assert to_run.keys() <= to_test.keys()
    assert all(to_test[line] == hashes for line, hashes in to_run.items())


@pytest.mark.parametrize("lock", [TO_RUN, TO_TEST], ids=["to run", "to test"])
def test_a_lock_holds_hashes_and_no_address(lock: Path) -> None:
    """Every line has hashes; where to fetch from is the machine's own affair."""
    text = lock.read_text(encoding="ascii")
    assert all(hashes and all(hash_.startswith("--hash=sha256:") for hash_ in hashes) for hashes in pins(lock).values())
    assert "://" not in text
    assert "--index" not in text


@pytest.mark.parametrize(
    ("lock", "wanted"),
    [(TO_RUN, line) for line in PROJECT["dependencies"]]
    + [(TO_TEST, line) for line in PROJECT["optional-dependencies"]["test"]],
)
def test_the_locks_hold_what_the_project_asks_for(lock: Path, wanted: str) -> None:
    """Each library that the project file names is locked, in versions that it allows."""
    requirement = Requirement(wanted)
    locked = versions(lock, requirement.name)
    assert locked
    assert all(version in requirement.specifier for version in locked)
