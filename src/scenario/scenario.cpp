#include "rainledger/scenario/scenario.hpp"

#include <utility>

#include "rainledger/base/whole_file.hpp"
#include "scenario/file_parts.hpp"
#include "scenario/plain_text.hpp"
#include "scenario/reading_warnings.hpp"
#include "scenario/storm_reader.hpp"
#include "scenario/surface_reader.hpp"
#include "scenario/yaml.hpp"
#include "scenario/yaml_document.hpp"

namespace rainledger {
namespace {

Scenario assemble(std::string title, std::vector<Storm> storms, std::vector<ReadSurface> surfaces) {
    Scenario scenario;
    scenario.title = std::move(title);
    scenario.storms = std::move(storms);
    for (ReadSurface& read : surfaces) {
        scenario.site.surfaces.push_back(std::move(read.surface));
        scenario.places.push_back(std::move(read.places));
    }
    return scenario;
}

std::optional<Scenario> read_scenario_parts(const std::string& name, std::string text,
                                            Diagnostics& diagnostics, Surfaces surfaces) {
    strip_byte_order_mark(text);
    const Reading reading(name, std::move(text), diagnostics);
    const auto document = read_document(reading);
    if (!document) return std::nullopt;
    if (refuse_other_kind(reading, *document)) return std::nullopt;
    const Entry root{"scenario", document->Mark(), *document};
    const auto map = ClosedMap::read(reading, root, "the scenario", kScenarioKeys,
                                     std::string(kScenarioFile.example));
    if (!map) return std::nullopt;
    std::string title = read_title(*map);
    std::vector<Storm> storms = read_storms(*map);
    std::vector<ReadSurface> read = read_surfaces(*map, surfaces);
    if (diagnostics.has_errors()) return std::nullopt;
    warn_about_scenario(storms, read, diagnostics);
    return assemble(std::move(title), std::move(storms), std::move(read));
}

}  // namespace

std::optional<Scenario> read_scenario(const std::string& path, Diagnostics& diagnostics,
                                      Surfaces surfaces) {
    std::string problem;
    auto text = read_whole_file(path, problem);
    if (!text) {
        diagnostics.unreadable({path, 0, 0, {}}, "cannot read the scenario: " + problem);
        return std::nullopt;
    }
    return read_scenario_text(path, std::move(*text), diagnostics, surfaces);
}

std::optional<Scenario> read_scenario_text(const std::string& name, std::string text,
                                           Diagnostics& diagnostics, Surfaces surfaces) {
    Diagnostics found;
    auto scenario = read_scenario_parts(name, std::move(text), found, surfaces);
    hand_over(found, name, diagnostics);
    return scenario;
}

}  // namespace rainledger
