"""The wheel carries everything the installed program needs."""

from __future__ import annotations

import subprocess
import sys
import zipfile
from pathlib import Path

import pytest

import fourcount
from fourcount.assets_folder import assets_folder

ROOT = Path(__file__).resolve().parents[2]


@pytest.fixture(scope="module")
def wheel(tmp_path_factory: pytest.TempPathFactory) -> zipfile.ZipFile:
    """The wheel, built without a network."""
    folder = tmp_path_factory.mktemp("wheel")
    command = [sys.executable, "-m", "hatchling", "build", "-t", "wheel", "-d", str(folder)]
    built = subprocess.run(command, cwd=ROOT, capture_output=True, text=True, check=False)
    assert built.returncode == 0, built.stderr
    (file,) = folder.glob("*.whl")
    return zipfile.ZipFile(file)


def test_the_wheel_carries_the_assets(wheel: zipfile.ZipFile) -> None:
    """Every file of assets lies in the wheel as fourcount/assets."""
    there = {file.relative_to(ROOT / "assets").as_posix() for file in (ROOT / "assets").rglob("*") if file.is_file()}
    prefix = "fourcount/assets/"
    carried = {name.removeprefix(prefix) for name in wheel.namelist() if name.startswith(prefix)}
    assert there
    assert carried == there


def test_the_wheel_carries_every_module(wheel: zipfile.ZipFile) -> None:
    """Every module of the source tree lies in the wheel, and nothing of the tests or of packaging."""
    source = ROOT / "appsrc"
    modules = {file.relative_to(source).as_posix() for file in source.rglob("*.py")}
    assert modules == {name for name in wheel.namelist() if name.endswith(".py")}


def test_the_wheel_says_what_it_is(wheel: zipfile.ZipFile) -> None:
    """Its metadata give the version of the package, the command and the licence's own text."""
    metadata = f"fourcount-{fourcount.__version__}.dist-info"
    text = wheel.read(f"{metadata}/METADATA").decode()
    assert f"Version: {fourcount.__version__}\n" in text
    assert "License-Expression: MIT\n" in text
    assert "fourcount = fourcount.__main__:main" in wheel.read(f"{metadata}/entry_points.txt").decode()
    assert any(name.endswith("MIT.txt") for name in wheel.namelist())


def test_the_source_tree_finds_its_assets() -> None:
    """From the source tree, the assets are those at its top."""
    assert assets_folder() == ROOT / "assets"


def test_the_installed_program_finds_its_assets(wheel: zipfile.ZipFile, tmp_path: Path) -> None:
    """Installed, the assets are those inside the package."""
    wheel.extractall(tmp_path)
    code = "from fourcount.assets_folder import assets_folder; print(assets_folder())"
    command = [sys.executable, "-S", "-c", f"import sys; sys.path.insert(0, {str(tmp_path)!r}); {code}"]
    found = subprocess.run(command, capture_output=True, text=True, check=True).stdout.strip()
    assert Path(found) == tmp_path.resolve() / "fourcount" / "assets"
