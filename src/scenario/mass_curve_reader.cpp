#include "scenario/mass_curve_reader.hpp"

#include <array>
#include <cstddef>
#include <vector>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/suggest.hpp"
#include "scenario/list_reader.hpp"

namespace rainledger {
namespace {

constexpr const char* kPointExample = "write a time and a depth as shares, such as [0.25, 0.1]";
constexpr const char* kCurveExample =
    "write a name such as 'curve: nrcs_II', or points as shares of the duration and the depth: "
    "'curve: [[0, 0], [0.25, 0.1], [1, 1]]'";

std::vector<std::string_view> curve_names() {
    std::vector<std::string_view> names;
    for (const MassCurveEntry& entry : mass_curve_table())
        names.push_back(entry.name);
    return names;
}

const MassCurveEntry* read_curve_name(const Reading& reading, const Entry& entry) {
    const auto name = read_text(reading, entry, kCurveExample, "a name or a list of points");
    if (!name) return nullptr;
    const MassCurveEntry* found = find_mass_curve(*name);
    if (found != nullptr) return found;
    const std::string meant = meant_curve(*name);
    reading.error(entry.mark(), "curve: " + in_quotes(*name) + " is not a curve here",
                  meant.empty() ? suggestion(*name, curve_names()) : "write " + meant);
    return nullptr;
}

/// One point; its shares are named by the point: "curve, entry 2".
std::optional<MassPoint> read_point(const Reading& reading, const Entry& entry) {
    if (!is_list(reading, entry, "a point of two numbers", kPointExample)) return std::nullopt;
    if (entry.value.size() != 2) {
        reading.error(
            entry.mark(),
            entry.key + ": a point has two numbers, not " + std::to_string(entry.value.size()),
            kPointExample);
        return std::nullopt;
    }
    const auto time = read_fraction(reading, {entry.key, entry.key_mark, entry.value[0]});
    const auto depth = read_fraction(reading, {entry.key, entry.key_mark, entry.value[1]});
    if (!time || !depth) return std::nullopt;
    return MassPoint{*time, *depth};
}

/// What is wrong with a point where it stands; empty: nothing.
std::string problem_of(const MassPoint& point, const std::optional<MassPoint>& before) {
    if (!before)
        return point.time == 0.0 && point.depth == 0.0 ? "" : "a mass curve begins at [0, 0]";
    if (!(point.time > before->time)) return "the time is not after that of the point before";
    if (!(point.depth >= before->depth)) return "the depth falls; a mass curve only rises";
    return {};
}

std::optional<std::vector<MassPoint>> read_points(const Reading& reading, const Entry& entry) {
    std::optional<MassPoint> before;
    auto points = read_list<MassPoint>(
        reading, entry, kCurveExample, [&](const Entry& each) -> std::optional<MassPoint> {
            const auto point = read_point(reading, each);
            if (!point) return std::nullopt;
            const std::string problem = problem_of(*point, before);
            before = point;
            if (problem.empty()) return point;
            reading.error(each.mark(), each.key + ": " + problem,
                          "points run from [0, 0] to [1, 1], times rising, depths not falling");
            return std::nullopt;
        });
    if (!points || (points->back().time == 1.0 && points->back().depth == 1.0)) return points;
    reading.error(entry.mark(), "curve: the last point is not [1, 1]",
                  "at the end of the duration all of the depth has fallen: add [1, 1]");
    return std::nullopt;
}

std::string lower_words(std::string_view typed) {
    std::string out;
    for (const char c : typed) {
        if (c >= 'A' && c <= 'Z')
            out += static_cast<char>(c - 'A' + 'a');
        else if (c != '_' && c != '-' && c != ' ')
            out += c;
    }
    return out;
}

/// Takes `part` off the front of `text`.
bool take(std::string& text, std::string_view part) {
    if (!text.starts_with(part)) return false;
    text.erase(0, part.size());
    return true;
}

struct Spelling {
    std::string_view typed;
    std::string_view name;
};

constexpr auto kNrcsTypes = std::to_array<Spelling>({{"i", "nrcs_I"},
                                                     {"1", "nrcs_I"},
                                                     {"ia", "nrcs_IA"},
                                                     {"1a", "nrcs_IA"},
                                                     {"ii", "nrcs_II"},
                                                     {"2", "nrcs_II"},
                                                     {"iii", "nrcs_III"},
                                                     {"3", "nrcs_III"}});
constexpr auto kQuartiles = std::to_array<Spelling>({{"1", "huff_1"},
                                                     {"2", "huff_2"},
                                                     {"3", "huff_3"},
                                                     {"4", "huff_4"},
                                                     {"i", "huff_1"},
                                                     {"ii", "huff_2"},
                                                     {"iii", "huff_3"},
                                                     {"iv", "huff_4"}});

/// "'curve: NAME'" for the spelling, or `any` for none at all.
template <std::size_t size>
std::string curve_of(std::string_view typed, const std::array<Spelling, size>& spellings,
                     const char* any) {
    if (typed.empty()) return any;
    for (const Spelling& spelling : spellings)
        if (spelling.typed == typed) return "'curve: " + std::string(spelling.name) + "'";
    return {};
}

}  // namespace

std::string meant_curve(std::string_view typed) {
    if (find_mass_curve(typed) != nullptr) return "'curve: " + std::string(typed) + "'";
    std::string rest = lower_words(typed);
    const auto end_of_day = rest.find("24h");
    if (end_of_day != std::string::npos) rest.erase(end_of_day);
    if (take(rest, "huff")) {
        static_cast<void>(take(rest, "quartile") || take(rest, "q"));
        return curve_of(rest, kQuartiles, "'curve: huff_1', or huff_2, huff_3, huff_4");
    }
    const bool agency = take(rest, "scs") || take(rest, "nrcs");
    const bool type = take(rest, "type");
    if (!agency && (!type || rest.empty())) return {};
    return curve_of(rest, kNrcsTypes, "'curve: nrcs_II', or nrcs_I, nrcs_IA, nrcs_III");
}

std::optional<ReadMassCurve> read_mass_curve(const ClosedMap& design) {
    const auto smooth = design.word("interpolate", kInterpolate);
    const Entry* entry = design.require("curve", "nrcs_II");
    if (entry == nullptr) return std::nullopt;
    const BetweenPoints between =
        smooth && *smooth == 1 ? BetweenPoints::smooth : BetweenPoints::linear;
    if (entry->value.IsSequence()) {
        const auto points = read_points(design.reading(), *entry);
        if (!points) return std::nullopt;
        return ReadMassCurve{MassCurve(*points, between), "points in the scenario", nullptr};
    }
    const MassCurveEntry* named = read_curve_name(design.reading(), *entry);
    if (named == nullptr) return std::nullopt;
    return ReadMassCurve{MassCurve(named->points, between),
                         std::string(named->title) + " (" + std::string(named->source) + ")",
                         named};
}

}  // namespace rainledger
