#include "scenario/file_parts.hpp"

#include <algorithm>
#include <array>
#include <filesystem>
#include <optional>
#include <set>
#include <string_view>
#include <tuple>
#include <utility>
#include <vector>

#include "rainledger/base/cut.hpp"
#include "scenario/plain_text.hpp"

namespace rainledger {
namespace {

/// Keys that only the one kind of file has at its top level.
constexpr auto kOfScenarios = std::to_array<std::string_view>({"storm", "storms", "surfaces"});
constexpr auto kOfFieldTests =
    std::to_array<std::string_view>({"readings", "ring", "steady_rate", "ignore_first"});

/// The first key of a document that is one of the words.
std::optional<YAML::Mark> first_of(const YAML::Node& document, Words words) {
    for (const auto& pair : document)
        if (pair.first.IsScalar() && holds(words, pair.first.Scalar())) return pair.first.Mark();
    return std::nullopt;
}

}  // namespace

bool refuse_other_kind(const Reading& reading, const YAML::Node& document) {
    if (!document.IsMap()) return false;
    const auto scenario = first_of(document, kOfScenarios);
    const auto field_test = first_of(document, kOfFieldTests);
    if (reading.kind().noun == kScenarioFile.noun) {
        if (scenario || !field_test) return false;
        reading.error(*field_test, "this is a field test, not a scenario",
                      "'rainledger fit' reads it");
        return true;
    }
    if (!scenario || field_test) return false;
    const bool has_surfaces = document["surfaces"].IsDefined();
    reading.error(*scenario, "this is a scenario, not a field test",
                  std::string("'rainledger ") + (has_surfaces ? "losses" : "storm") + "' reads it");
    return true;
}

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

}  // namespace rainledger
