"""Reference data for lib/kinematics, from Debian's numpy (python3-numpy) and PyKDL (python3-pykdl).

Reads a JSON list of {"name", "arm", "freedoms"} on standard input, draws postures inside the limits with a seeded
generator, and prints one JSON object on standard output. Argument: postures an arm. SI units.

Poses and Jacobians come from PyKDL's recursive solvers, singular values and null spaces from numpy's SVD, and
the speed polytopes from plain enumeration: every crossing of bounds is tried for a corner. Facets come from the published
formulas (Chiacchio et al. 1996) where they exist, and otherwise, and for the first posture of each arm in any case, from trying every
plane through three corners.
"""

import itertools
import json
import sys

import numpy as np
import PyKDL

SEED = 20260417
ENUMERATED = 1
FIXED = getattr(PyKDL.Joint, "Fixed", None)
if FIXED is None:
    FIXED = getattr(PyKDL.Joint, "None")
ROWS = {"x": 0, "y": 1, "z": 2, "rx": 3, "ry": 4, "rz": 5}


def frame_of(frame):
    if frame is None:
        return PyKDL.Frame.Identity()
    return PyKDL.Frame(PyKDL.Rotation.RPY(*frame["rpy"]), PyKDL.Vector(*frame["xyz"]))


def chain_of(arm):
    chain = PyKDL.Chain()
    fixed = lambda frame: chain.addSegment(PyKDL.Segment(PyKDL.Joint(FIXED), frame))
    fixed(frame_of(arm.get("base")))
    for joint in arm["joints"]:
        kind = PyKDL.Joint(PyKDL.Joint.RotZ if joint["type"] == "revolute" else PyKDL.Joint.TransZ)
        numbers = (joint["a"], joint["alpha"], joint["d"], joint["theta"])
        if arm["convention"] == "standard":
            chain.addSegment(PyKDL.Segment(kind, PyKDL.Frame.DH(*numbers)))
        else:
            fixed(PyKDL.Frame.DH_Craig1989(*numbers))
            chain.addSegment(PyKDL.Segment(kind, PyKDL.Frame.Identity()))
    fixed(frame_of(arm.get("tool")))
    return chain


class Reference:
    def __init__(self, entry):
        arm = entry["arm"]
        self.chain = chain_of(arm)
        joints = self.chain.getNrOfJoints()
        self.coupling = np.array(arm.get("coupling", np.eye(joints)), dtype=float)
        self.driven = arm.get("actuators", arm["joints"])
        self.speeds = np.array([row["maxSpeed"] for row in self.driven])
        rows = [ROWS[name] for name in entry["freedoms"]]
        self.linear = [row for row in rows if row < 3]
        self.angular = [row for row in rows if row >= 3]
        self.poses = PyKDL.ChainFkSolverPos_recursive(self.chain)
        self.jacobians = PyKDL.ChainJntToJacSolver(self.chain)

    def posture(self, generator):
        low = np.array([row["min"] for row in self.driven])
        high = np.array([row["max"] for row in self.driven])
        return low + (high - low) * generator.random(len(low))

    def answer(self, posture, enumerate_facets):
        q = self.coupling @ posture
        values = PyKDL.JntArray(len(q))
        for index, value in enumerate(q):
            values[index] = value
        frame = PyKDL.Frame()
        self.poses.JntToCart(values, frame)
        columns = PyKDL.Jacobian(len(q))
        self.jacobians.JntToJac(values, columns)
        matrix = np.array([[columns[r, c] for c in range(len(q))] for r in range(6)]) @ self.coupling
        return {
            "posture": posture.tolist(),
            "pose": [[frame[r, c] for c in range(4)] for r in range(3)],
            "jacobian": matrix.tolist(),
            "wristFree": self.measures(matrix, [], enumerate_facets),
            "wristHeld": self.measures(matrix, self.angular, enumerate_facets),
        }

    def measures(self, matrix, held, enumerate_facets):
        scaled = matrix * self.speeds
        basis = null_space(scaled[held]) if held else np.eye(len(self.speeds))
        generators = scaled[self.linear] @ basis
        gains = np.linalg.svd(generators, compute_uv=False)
        rows = matrix[self.linear + held]
        corners = corners_of(generators, basis)
        sure = None if enumerate_facets else sure_by_formula(generators, basis, corners)
        return {
            "gains": gains.tolist(),
            "manipulability": float(np.prod(np.linalg.svd(rows, compute_uv=False))),
            "maximumToolSpeed": float(np.linalg.norm(corners, axis=1).max()),
            "sureSpeed": least_facet(corners) if sure is None else sure,
        }


def null_space(matrix):
    _, values, vt = np.linalg.svd(matrix)
    rank = int((values > 1e-12 * values[0]).sum())
    return vt[rank:].T


def corners_of(generators, basis):
    """All points generators @ y where |basis @ y| <= 1 holds and as many bounds cross as y has entries."""
    bounds, free = basis.shape
    found = []
    signs = np.array(list(itertools.product([1.0, -1.0], repeat=free))).T
    for pick in itertools.combinations(range(bounds), free):
        square = basis[list(pick)]
        if abs(np.linalg.det(square)) < 1e-12:
            continue
        y = np.linalg.solve(square, signs)
        inside = np.all(np.abs(basis @ y) < 1 + 1e-9, axis=0)
        found.append((generators @ y[:, inside]).T)
    return np.vstack(found)


def sure_by_formula(generators, basis, corners):
    """Zonotope: facet normals are cross products of generators; square set: 1 / the longest row of the inverse; one coordinate
    more than dimensions: a facet's normal n has generators.T @ n in the span of two bounds; else None."""
    dimensions, free = generators.shape
    if dimensions == free:
        return float(1 / np.linalg.norm(basis @ np.linalg.inv(generators), axis=1).max())
    if free != len(basis):
        return sure_by_pairs(generators, basis, corners) if free == dimensions + 1 else None
    if dimensions == 2:
        normals = np.stack([-generators[1], generators[0]], axis=1)
    elif dimensions == 3:
        first, second = np.array(list(itertools.combinations(range(free), 2))).T
        normals = np.cross(generators.T[first], generators.T[second])
    else:
        return None
    lengths = np.linalg.norm(normals, axis=1)
    normals = normals[lengths > 1e-12] / lengths[lengths > 1e-12, None]
    return float(np.abs(normals @ generators).sum(axis=1).min())


def sure_by_pairs(generators, basis, corners):
    """Every pair of bounds at once: the null direction of [generators.T, first bound, second bound] starts with a normal."""
    first, second = np.array(list(itertools.combinations(range(len(basis)), 2))).T
    systems = np.concatenate(
        [np.broadcast_to(generators.T, (len(first), *generators.T.shape)), basis[first, :, None], basis[second, :, None]], axis=2
    )
    _, values, vt = np.linalg.svd(systems)
    normals = vt[:, -1, : len(generators)]
    lengths = np.linalg.norm(normals, axis=1)
    usable = (values[:, -1] > 1e-9 * values[:, 0]) & (lengths > 1e-9)
    normals = normals[usable] / lengths[usable, None]
    return float(np.abs(normals @ corners.T).max(axis=1).min())


def least_facet(corners):
    """Least distance of a facet of the hull from the centre, over all lines or planes through corners."""
    dimensions = corners.shape[1]
    if dimensions == 1:
        return float(np.abs(corners).max())
    _, first = np.unique(np.round(corners, 9), axis=0, return_index=True)
    points = corners[first]
    picks = np.array(list(itertools.combinations(range(len(points)), dimensions)))
    start = points[picks[:, 0]]
    if dimensions == 2:
        along = points[picks[:, 1]] - start
        normals = np.stack([-along[:, 1], along[:, 0]], axis=1)
    else:
        normals = np.cross(points[picks[:, 1]] - start, points[picks[:, 2]] - start)
    lengths = np.linalg.norm(normals, axis=1)
    # A plane through three corners in a line, or through the centre, is no facet of a solid set.
    usable = lengths > 1e-7
    normals = normals[usable] / lengths[usable, None]
    distances = np.abs(np.einsum("ij,ij->i", normals, start[usable]))
    order = np.argsort(distances)
    for index in order[distances[order] > 1e-9]:
        if np.abs(points @ normals[index]).max() <= distances[index] + 1e-8:
            return float(np.abs(points @ normals[index]).max())
    return 0.0


def main():
    count = int(sys.argv[1])
    arms = []
    for index, entry in enumerate(json.load(sys.stdin)):
        generator = np.random.default_rng([SEED, index])
        reference = Reference(entry)
        answers = [reference.answer(reference.posture(generator), k < ENUMERATED) for k in range(count)]
        arms.append({**entry, "answers": answers})
    versions = {"numpy": np.__version__, "seed": SEED}
    json.dump({"madeWith": versions, "arms": arms}, sys.stdout, separators=(",", ":"))
    sys.stdout.write("\n")


main()
