#include <algorithm>
#include <array>
#include <string>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/number.hpp"
#include "rainledger/base/unit_spellings.hpp"
#include "scenario/list_reader.hpp"
#include "scenario/storm_reader.hpp"

// Rain written out step by step in the scenario.
namespace rainledger {
namespace {

constexpr double kShortestStepH = 1.0 / 3.6e6;  // 1 ms; intensities stay finite

constexpr const char* kStepsExample =
    "write 'steps: {every: 5 min, depths: [0.4, 1.1, 2.6], unit: mm}'";
constexpr const char* kTimesHint =
    "write 'every: 5 min' for equal steps, or 'ends: [5 min, 12 min]'";
constexpr auto kStepTimes = std::to_array<std::string_view>({"every", "ends"});
constexpr auto kStepRain = std::to_array<std::string_view>({"depths", "intensities"});

/// A time as it was given.
struct GivenTime {
    double number = 0.0;
    std::string unit;
};

/// Splits a time that has already been read: "15 min".
GivenTime split_time(const std::string& text) {
    const std::size_t end = text.find_last_not_of(" \t") + 1;
    const std::size_t unit = text.find_last_of("0123456789. \t", end - 1) + 1;
    const std::size_t begin = text.find_first_not_of(" \t");
    const std::size_t stop = text.find_last_not_of(" \t", unit - 1) + 1;
    return {*parse_number(text.substr(begin, stop - begin)), text.substr(unit, end - unit)};
}

/// Edges in the unit they were given in, with the durations between them in h.
struct Edges {
    std::vector<double> value;
    std::string unit;
    std::vector<double> duration_h;
};

Edges equal_edges(const std::string& text, double every_h, std::size_t steps) {
    const GivenTime every = split_time(text);
    Edges edges;
    edges.unit = every.unit;
    for (std::size_t i = 0; i <= steps; ++i)
        edges.value.push_back(static_cast<double>(i) * every.number);
    edges.duration_h.assign(steps, every_h);
    return edges;
}

/// The end of a step, later than `before` (h).
std::optional<double> read_end(const Reading& reading, const Entry& entry, double before) {
    const auto end = read_step_length(reading, entry);
    if (!end || *end - before >= kShortestStepH) return end;
    reading.error(
        entry.mark(),
        entry.key + ": " + in_quotes(entry.value.Scalar()) + " is not after the end before it",
        "ends count from the storm's start and rise from one to the next");
    return std::nullopt;
}

/// The ends of steps, kept in their unit where it is one and the same, else in h.
std::optional<Edges> read_ends(const Reading& reading, const Entry& list) {
    double before = 0.0;
    std::vector<GivenTime> given;
    const auto ends_h = read_list<double>(reading, list, kStepsExample, [&](const Entry& entry) {
        const auto end = read_end(reading, entry, before);
        if (end) {
            before = *end;
            given.push_back(split_time(entry.value.Scalar()));
        }
        return end;
    });
    if (!ends_h) return std::nullopt;
    const bool same = std::ranges::all_of(
        given, [&](const GivenTime& time) { return time.unit == given.front().unit; });
    Edges edges;
    edges.unit = same ? given.front().unit : "h";
    edges.value.push_back(0.0);
    for (std::size_t i = 0; i < given.size(); ++i)
        edges.value.push_back(same ? given[i].number : (*ends_h)[i]);
    const Unit unit = *find_unit(edges.unit, Dimension::time);
    for (std::size_t i = 0; i < given.size(); ++i)
        edges.duration_h.push_back(unit.to_canonical(edges.value[i + 1] - edges.value[i]));
    return edges;
}

/// The unit of the numbers: one of depth for depths, one of rate for intensities.
std::optional<Unit> read_rain_unit(const ClosedMap& map, Dimension dimension) {
    const bool depths = dimension == Dimension::depth;
    const std::string example = depths ? "mm" : "mm/h";
    const Entry* entry = map.require("unit", example);
    if (entry == nullptr) return std::nullopt;
    const auto name = read_text(map.reading(), *entry, "write 'unit: " + example + "'");
    if (!name) return std::nullopt;
    const auto unit = find_unit(*name, dimension);
    if (unit) return unit;
    const bool other = find_unit(*name, depths ? Dimension::rate : Dimension::depth).has_value();
    std::string hint = "units: " + std::string(accepted_units(dimension));
    if (other)
        hint = depths ? "for numbers in " + *name + " write 'intensities' in place of 'depths'"
                      : "for numbers in " + *name + " write 'depths' in place of 'intensities'";
    else if (const auto meant = meant_unit(*name, dimension))
        hint = "did you mean '" + *meant + "'? (" + hint + ")";
    map.reading().error(
        entry->mark(),
        "unit: " + in_quotes(*name) + " is not a unit of " + (depths ? "depth" : "intensity"),
        hint);
    return std::nullopt;
}

std::optional<Edges> read_edges(const ClosedMap& map, const Entry& time, std::size_t steps) {
    if (time.key == "ends") return read_ends(map.reading(), time);
    const auto every_h = read_step_length(map.reading(), time);
    if (!every_h) return std::nullopt;
    return equal_edges(time.value.Scalar(), *every_h, steps);
}

/// Where two whole numbers meet at a comma without a blank: the text of both, such as "1,2".
std::string_view pair_at_comma(std::string_view list, std::size_t comma) {
    constexpr std::string_view kDigits = "0123456789";
    constexpr std::string_view kBounds = "[, \t\r\n";
    const std::size_t before = list.find_last_not_of(kDigits, comma - 1);
    const std::size_t after = std::min(list.find_first_not_of(kDigits, comma + 1), list.size());
    const bool digits = before != comma - 1 && after != comma + 1;
    if (!digits || kBounds.find(list[before]) == std::string_view::npos) return {};
    if (after < list.size() && kBounds.find(list[after]) == std::string_view::npos) return {};
    return list.substr(before + 1, after - before - 1);
}

/// Whether the comma parts entries as people write them: a blank and more on the same line.
bool parts_with_blank(std::string_view list, std::size_t comma) {
    const std::size_t next = list.find_first_not_of(" \t", comma + 1);
    return next > comma + 1 && next < list.size() && list[next] != '\n' && list[next] != '\r' &&
           list[next] != '#';
}

/// Commas of both kinds in one list: those without a blank were likely meant for decimals.
void warn_decimal_commas(const Reading& reading, const Entry& rain) {
    std::string_view list = reading.from(rain.value.Mark());
    if (!rain.value.IsSequence() || !list.starts_with('[')) return;
    list = list.substr(0, list.find(']'));
    std::string_view pair;
    bool blanks = false;
    for (std::size_t comma = list.find(','); comma != std::string_view::npos;
         comma = list.find(',', comma + 1)) {
        if (pair.empty()) pair = pair_at_comma(list, comma);
        blanks = blanks || parts_with_blank(list, comma);
    }
    if (pair.empty() || !blanks) return;
    std::string decimal(pair);
    decimal[decimal.find(',')] = '.';
    reading.warning(rain.mark(), "commas separate entries: " + cut(pair) + " are two entries",
                    "write " + cut(decimal) + " for a decimal");
}

/// The numbers of a list of depths or intensities, in mm or mm/h.
std::optional<std::vector<double>> read_rain_numbers(const ClosedMap& map, const Entry& rain) {
    const auto unit =
        read_rain_unit(map, rain.key == "depths" ? Dimension::depth : Dimension::rate);
    // Without a unit the numbers are still looked at, so that all errors come in one run.
    const Unit factor = unit.value_or(Unit{});
    auto numbers = read_list<double>(map.reading(), rain, kStepsExample, [&](const Entry& entry) {
        const std::string hint = "write a plain number of zero or more; 'unit' says the unit once";
        auto number = read_bare(map.reading(), entry, hint);
        if (number) number = factor.to_canonical(*number);
        if (number && !(*number <= kLargestValue)) {
            map.reading().error(entry.mark(), entry.key + ": too large to compute with", hint);
            number.reset();
        }
        return number;
    });
    if (!unit) numbers.reset();
    warn_decimal_commas(map.reading(), rain);
    return numbers;
}

bool match(const Reading& reading, const Edges& edges, const Entry& rain, std::size_t numbers) {
    if (edges.duration_h.size() == numbers) return true;
    reading.error(rain.mark(),
                  "'ends' holds " + std::to_string(edges.duration_h.size()) + " entries and '" +
                      rain.key + "' " + std::to_string(numbers),
                  "write one number for each step");
    return false;
}

}  // namespace

std::optional<double> read_step_length(const Reading& reading, const Entry& entry) {
    const auto hours = read_quantity(reading, entry, Dimension::time, Least::above_zero);
    if (hours && *hours < kShortestStepH) {
        reading.error(entry.mark(), entry.key + ": a step shorter than 1 ms cannot be computed",
                      "check the number and its unit");
        return std::nullopt;
    }
    return hours;
}

std::optional<Hyetograph> read_steps(const Reading& reading, const Entry& entry) {
    const auto map = ClosedMap::read(reading, entry, "steps", kStepsKeys, kStepsExample);
    if (!map) return std::nullopt;
    const Entry* time =
        map->exactly_one(kStepTimes, "steps needs 'every' or 'ends'", kTimesHint, kTimesHint);
    const Entry* rain = map->exactly_one(kStepRain, "steps needs 'depths' or 'intensities'",
                                         kStepsExample, kStepsExample);
    std::optional<std::vector<double>> numbers;
    if (rain != nullptr) numbers = read_rain_numbers(*map, *rain);
    if (time == nullptr) return std::nullopt;
    const auto edges = read_edges(*map, *time, numbers ? numbers->size() : 0);
    if (!edges || !numbers || !match(reading, *edges, *rain, numbers->size())) return std::nullopt;
    if (rain->key == "intensities")
        for (std::size_t i = 0; i < numbers->size(); ++i)
            (*numbers)[i] *= edges->duration_h[i];
    Hyetograph hyetograph = make_hyetograph(edges->value, edges->unit, *std::move(numbers));
    // From the duration as given: differences of edges such as 0.3 h would differ in the last bit.
    hyetograph.duration_h = edges->duration_h;
    return hyetograph;
}

}  // namespace rainledger
