"""The systems that every peer is given: nested meshes of the workloads, in watts and kelvin.

A peer gets for nothing what our own program works out by itself: a good mesh. The scenarios and the answers are
those of tests/reference/; the meshes are set here.
"""
import json
import math
import pathlib

SIGMA = 5.670374419e-8
KELVIN = 273.15
REFERENCE = pathlib.Path(__file__).resolve().parents[1] / "reference"

# Meshes, each as (cells across the slowest layer, how often all cells are halved after that), coarsest first.
MESHES = {"W1": [(6, 0), (6, 1), (6, 2), (6, 3)], "W2": [(5, 0), (6, 0), (5, 1), (5, 2), (5, 3)]}
# Cells of each layer before halving, as our own program chooses them.
CELLS = {("W1", 6): [6], ("W2", 5): [5, 1, 2], ("W2", 6): [6, 1, 2]}
# Which sides of each layer its nodes are drawn towards.
DRAWN = {"W1": ["out"], "W2": ["out", "both", "both"]}


def case(name):
    return json.loads((REFERENCE / f"{name}.json").read_text())


def truth(name):
    return case(name)["expected"][0]["value"]


def cells(name, mesh):
    slowest, halvings = mesh
    return [count * 2**halvings for count in CELLS[name, slowest]]


def _places(layers, name, mesh):
    places, layer_of_cell = [0.0], []
    for number, (layer, count) in enumerate(zip(layers, cells(name, mesh))):
        start = places[-1]
        for i in range(1, count + 1):
            s = i / count
            drawn = {"out": math.sin(math.pi / 2 * s), "both": 0.5 * (1 - math.cos(math.pi * s))}
            places.append(start + layer["thickness_m"] * drawn[DRAWN[name][number]])
            layer_of_cell.append(number)
    return places, layer_of_cell


class System:
    """Nodes in a row: insulated inside, film and radiation outside."""

    def __init__(self, name, mesh):
        scenario = case(name)["scenario"]
        item, outer = scenario["item"], scenario["surroundings"]["outer"][0]
        layers = item["layers"]
        places, layer_of_cell = _places(layers, name, mesh)
        around = item["shape"] == "cylinder"
        self.name, self.nodes = name, len(places)
        self.capacity, self.link = [0.0] * self.nodes, []
        for i, number in enumerate(layer_of_cell):
            layer, (a, b) = layers[number], places[i : i + 2]
            middle = 0.5 * (a + b)
            volumes = (middle - a, b - middle)
            if around:
                volumes = (math.pi * (middle**2 - a**2), math.pi * (b**2 - middle**2))
            area = 2 * math.pi * middle if around else 1.0
            self.link.append(layer["conductivity_w_per_m_k"] * area / (b - a))
            per_volume = layer["density_kg_per_m3"] * layer["heat_capacity_j_per_kg_k"]
            self.capacity[i] += per_volume * volumes[0]
            self.capacity[i + 1] += per_volume * volumes[1]
        area = 2 * math.pi * places[-1] if around else 1.0
        self.film = area * outer["film_w_per_m2_k"]
        self.radiation = area * outer.get("emissivity", 0.0) * SIGMA
        self.surroundings = outer["temperature_c"] + KELVIN
        self.start = scenario["start"]["uniform_c"] + KELVIN
        self.target = scenario["ready_when"][0]["below_c"] + KELVIN

    def text(self):
        """Five lines, as the compiled peers read them."""
        words = lambda numbers: " ".join(repr(float(x)) for x in numbers)
        ends = (self.film, self.radiation, self.surroundings, self.start)
        head = f"{self.name} {self.target!r}"
        return "\n".join([head, words(self.capacity), words(self.link), words(ends), "", ""])
