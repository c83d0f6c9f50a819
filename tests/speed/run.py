"""Our march and our whole answer beside general-purpose solvers, side by side in one run, at equal error.

    python3 tests/speed/run.py [--quick] [--install]

Every peer is given the same systems on the same nested meshes (systems.py). Processor time of one thread; the
programs take turns, and each time is the median of its turns, each the median of its repetitions. A setting counts only if all tighter tolerances on that mesh hold the error as well, so that no lucky hit wins.
Absolute times move from machine to machine: the ratios at the end are what is held against the goals.

Needs Rust (ours, diffsol). Peers that are not there are left out and named: CVODE in C needs a C compiler and the
headers of SUNDIALS 6 (Debian: libsundials-dev); the ones driven from Python need requirements.txt, which
--install puts into target/speed/python. Not part of `cargo verify`. About five minutes, ten more to build at first.
"""
import collections
import os
import pathlib
import shutil
import statistics
import subprocess
import sys

import systems

HERE = pathlib.Path(__file__).resolve().parent
TARGET = HERE.parents[1] / "target" / "speed"
WORKLOADS = ("W1", "W2")
ERRORS = (1e-3, 1e-4)
TURNS, REPETITIONS = (1, 3) if "--quick" in sys.argv else (3, 5)
COMPILED, FROM_PYTHON, OURS = "compiled", "from Python", "ours"

# How many times faster our march is to be, at each of ERRORS.
GOALS = {("W1", FROM_PYTHON): (30, 20), ("W1", COMPILED): (4, 3.5), ("W2", FROM_PYTHON): (20, 20), ("W2", COMPILED): (3, 3.5)}
# The whole answer: a quarter of the bare march of CVODE driven from Python, three times that of diffsol.
WHOLE_ANSWER = {"from Python: cvode-band": 0.25, "diffsol": 3.0}

Row = collections.namedtuple("Row", "workload nodes peer kind tolerance error milliseconds")


def run(command, text=None):
    environment = dict(os.environ, CARGO_TARGET_DIR=str(TARGET), RAYON_NUM_THREADS="1")
    return subprocess.run(command, input=text, capture_output=True, text=True, env=environment, check=True).stdout


def build():
    """Peers as (name before the method, kind, command, input)."""
    text = "".join(systems.System(name, mesh).text() for name in WORKLOADS for mesh in systems.MESHES[name])
    repetitions = str(REPETITIONS)
    peers = []
    for name, manifest in (("ours", "ours"), ("peer-diffsol", "peers/diffsol")):
        print(f"building {name}", flush=True)
        run(["cargo", "build", "--release", "--quiet", "--manifest-path", str(HERE / manifest / "Cargo.toml")])
    ours = [str(TARGET / "release" / "ours"), repetitions]
    for name in WORKLOADS:
        # Our own meshes of so many cells have the same places as those of the peers.
        meshes = [f"{slowest}:{halvings}" for slowest, halvings in systems.MESHES[name]]
        ours += [name, str(systems.REFERENCE / f"{name}.json"), ",".join(meshes)]
    peers.append(("", OURS, ours, None))
    peers.append(("diffsol: ", COMPILED, [str(TARGET / "release" / "peer-diffsol"), repetitions], text))
    if build_cvode():
        peers.append(("CVODE in C: ", COMPILED, [str(TARGET / "peer-cvode"), repetitions], text))
    python = find_python()
    if python:
        peers.append(("from Python: ", FROM_PYTHON, [python, str(HERE / "from_python.py"), repetitions, *WORKLOADS], None))
    return peers


def build_cvode():
    libraries = ["cvode", "sunmatrixband", "sunlinsolband", "nvecserial"]
    command = ["cc", "-O3", "-march=native", str(HERE / "peers" / "cvode.c"), "-o", str(TARGET / "peer-cvode")]
    try:
        run(command + [f"-lsundials_{name}" for name in libraries] + ["-lm"])
    except (OSError, subprocess.CalledProcessError):
        print("left out: CVODE in C (no C compiler, or no headers of SUNDIALS 6)")
        return False
    return True


def find_python():
    """A Python that has the requirements: the one of --install, else this one."""
    own = TARGET / "python"
    if "--install" in sys.argv and not own.exists():
        run([sys.executable, "-m", "venv", str(own)])
        run([str(own / "bin" / "pip"), "install", "--quiet", "-r", str(HERE / "requirements.txt")])
    for python in (own / "bin" / "python", pathlib.Path(sys.executable)):
        if python.exists():
            try:
                run([str(python), "-c", "import numba, numpy, scipy, sksundae"])
            except subprocess.CalledProcessError:
                continue
            return str(python)
    print("left out: the peers driven from Python (start with --install)")
    return None


def measure(peers):
    """All rows, the programs by turns, so that what else the machine does meets all alike."""
    turns = collections.defaultdict(list)
    for turn in range(TURNS):
        for prefix, kind, command, text in peers:
            print(f"turn {turn + 1}, {prefix.rstrip(': ') or 'ours'}, load {os.getloadavg()[0]:.1f}", flush=True)
            for line in run(command, text).splitlines():
                name, nodes, method, tolerance, time, _, milliseconds = line.split()
                error = abs(float(time) / systems.truth(name) - 1.0)
                row = Row(name, int(nodes), prefix + method, kind, float(tolerance), error, 0.0)
                turns[row].append(float(milliseconds))
    return [row._replace(milliseconds=statistics.median(times)) for row, times in turns.items()]


def cheapest(rows):
    """{(workload, peer, error allowed): row}"""
    of_one_mesh = collections.defaultdict(list)
    for row in rows:
        of_one_mesh[row.workload, row.peer, row.nodes].append(row)
    best = {}
    for (workload, peer, _), settings in of_one_mesh.items():
        settings.sort(key=lambda row: -row.tolerance)
        for allowed in ERRORS:
            for i, row in enumerate(settings):
                # A time that is not a number holds nothing.
                holds = all(tighter.error <= allowed for tighter in settings[i:])
                key = workload, peer, allowed
                if holds and (key not in best or row.milliseconds < best[key].milliseconds):
                    best[key] = row
    return best


def print_table(best):
    print("\n| workload | error allowed | peer | nodes | tolerance, K | error | ms |")
    print("| --- | --- | --- | --- | --- | --- | --- |")
    for (workload, peer, allowed), row in sorted(best.items(), key=lambda kv: (kv[0][0], -kv[0][2], kv[1].milliseconds)):
        print(f"| {workload} | {allowed:g} | {peer} | {row.nodes} | {row.tolerance:g} | {row.error:.1e} | {row.milliseconds:.4g} |")


def print_ratios(best):
    print("\n| workload | error allowed | ours | against the best of | its ms / ours | goal | |")
    print("| --- | --- | --- | --- | --- | --- | --- |")
    for (workload, kind), goals in GOALS.items():
        for allowed, goal in zip(ERRORS, goals):
            print_ratio(best, workload, allowed, "march", kind, lambda row: row.kind == kind, goal)
    for workload in WORKLOADS:
        for peer, share in WHOLE_ANSWER.items():
            for allowed in ERRORS:
                print_ratio(best, workload, allowed, "answer", peer, lambda row: row.peer.startswith(peer), 1.0 / share)


def print_ratio(best, workload, allowed, method, against, is_peer, goal):
    ours = best.get((workload, method, allowed))
    others = [row for key, row in best.items() if (key[0], key[2]) == (workload, allowed) and is_peer(row)]
    if ours is None or not others:
        print(f"| {workload} | {allowed:g} | {method} | {against} | {'left out' if ours else 'not reached'} | {goal:.3g} | |")
        return
    other = min(others, key=lambda row: row.milliseconds)
    ratio = other.milliseconds / ours.milliseconds
    verdict = "reached" if ratio >= goal else "missed"
    print(f"| {workload} | {allowed:g} | {method} | {against} ({other.peer}) | {ratio:.3g} | {goal:.3g} | {verdict} |")


def main():
    if shutil.which("cargo") is None:
        sys.exit("cargo is needed")
    TARGET.mkdir(parents=True, exist_ok=True)
    best = cheapest(measure(build()))
    print_table(best)
    print_ratios(best)


main()
