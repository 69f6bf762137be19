#include "rainledger/scenario/scenario.hpp"

#include <algorithm>
#include <filesystem>
#include <set>
#include <tuple>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/whole_file.hpp"
#include "scenario/plain_text.hpp"
#include "scenario/reading_warnings.hpp"
#include "scenario/storm_reader.hpp"
#include "scenario/surface_reader.hpp"
#include "scenario/yaml.hpp"
#include "scenario/yaml_document.hpp"

namespace rainledger {
namespace {

std::string read_title(const ClosedMap& map) {
    auto title = map.text("title", "write a title, or take the key out");
    // A title written as a block ends in a line break that belongs to YAML.
    while (title && title->ends_with('\n'))
        title->pop_back();
    if (title && holds_hidden_characters(*title))
        map.reading().error(map.mark_of("title"),
                            "title: " + in_quotes(*title) + " holds a character that is not shown",
                            kHiddenHint);
    return title.value_or(std::filesystem::path(map.reading().name()).filename().string());
}

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
    if (const auto bad = first_byte_not_text(reading.text())) {
        diagnostics.error(reading.at_byte(*bad), "this is not UTF-8 text",
                          "save the scenario as plain text in UTF-8");
        return std::nullopt;
    }
    const auto document = read_document(reading);
    if (!document) return std::nullopt;
    const Entry root{"scenario", document->Mark(), *document};
    const auto map =
        ClosedMap::read(reading, root, "the scenario", kScenarioKeys, kScenarioExample);
    if (!map) return std::nullopt;
    std::string title = read_title(*map);
    std::vector<Storm> storms = read_storms(*map);
    std::vector<ReadSurface> read = read_surfaces(*map, surfaces);
    if (diagnostics.has_errors()) return std::nullopt;
    warn_about_scenario(storms, read, diagnostics);
    return assemble(std::move(title), std::move(storms), std::move(read));
}

/// Hands problems on in the order in which they stand in the scenario; those of other files follow,
/// each once even where several storms name the file.
void hand_over(const Diagnostics& found, const std::string& name, Diagnostics& diagnostics) {
    std::vector<Diagnostic> list = found.list();
    std::ranges::stable_sort(list, {}, [&](const Diagnostic& each) {
        const bool elsewhere = each.place.file != name;
        return elsewhere ? std::tuple(true, std::size_t{0}, std::size_t{0})
                         : std::tuple(false, each.place.line, each.place.column);
    });
    std::set<std::tuple<std::string, std::size_t, std::size_t, std::string>> told;
    for (Diagnostic& each : list) {
        const Place& place = each.place;
        const bool again = place.file != name &&
                           !told.emplace(place.file, place.line, place.column, each.message).second;
        if (again) continue;
        if (each.trouble == Trouble::unreadable)
            diagnostics.unreadable(std::move(each.place), each.message, each.hint);
        else if (each.severity == Severity::error)
            diagnostics.error(std::move(each.place), each.message, each.hint);
        else
            diagnostics.warning(std::move(each.place), each.message, each.hint);
    }
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
