#include <algorithm>
#include <map>
#include <string>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/suggest.hpp"
#include "scenario/plain_text.hpp"
#include "scenario/surface_reader.hpp"

// Which surface runs onto which.
namespace rainledger {
namespace {

constexpr double kShareRoom = 1.0e-12;  // shares such as 0.1 and 0.9 may sum to a bit over one
constexpr std::size_t kMostNamed = 20;  // surfaces of a loop; the rest are counted
constexpr const char* kRunOnExample =
    "write a surface's name, or shares such as 'runs_onto: {verge: 30 %}'";

using Names = std::map<std::string, std::size_t, std::less<>>;

std::optional<double> read_share(const Reading& reading, const Entry& entry) {
    const std::string hint = "write a share above 0 and up to 1, such as '0.3' or '30 %'";
    const auto text = read_text(reading, entry, hint);
    if (!text) return std::nullopt;
    const ParsedQuantity parsed = parse_share(*text);
    if (!parsed.value) {
        reading.error(entry.mark(), parsed.problem, hint);
        return std::nullopt;
    }
    if (*parsed.value > 0.0 && *parsed.value <= 1.0) return parsed.value;
    const bool percentage = *parsed.value >= 2.0 && *parsed.value <= 100.0 && !text->ends_with('%');
    reading.error(entry.mark(), "a share of " + in_quotes(*text) + " is not above 0 and up to 1",
                  percentage ? "did you mean '" + cut(*text) + " %'? " + hint : hint);
    return std::nullopt;
}

/// The name most like `typed` among the surfaces.
std::string name_hint(const std::string& typed, const std::vector<ReadSurface>& surfaces) {
    constexpr std::size_t kMostCompared = 1000;  // bounds the work on a large site
    std::vector<std::string_view> names;
    for (const ReadSurface& read : surfaces)
        if (names.size() < kMostCompared) names.push_back(read.surface.name);
    if (const auto name = nearest(typed, names)) return "did you mean " + in_quotes(*name) + "?";
    return "name another surface of this scenario";
}

void resolve_one(const Reading& reading, std::vector<ReadSurface>& surfaces, const Names& names,
                 std::size_t giver) {
    ReadSurface& read = surfaces[giver];
    for (const NamedShare& named : read.runs_onto) {
        const auto found = names.find(named.surface);
        if (found == names.end())
            reading.error(named.mark, "runs_onto: there is no surface " + in_quotes(named.surface),
                          name_hint(named.surface, surfaces));
        else if (found->second == giver)
            reading.error(named.mark, "surface " + in_quotes(named.surface) + " runs onto itself",
                          "name another surface, or take runs_onto out");
        else
            read.surface.runs_onto.push_back({found->second, named.share});
    }
}

/// A walk along run-on that reports each loop it closes. Surfaces stand on the walk's path from
/// their first visit until all that lies below them is done.
class LoopSearch {
public:
    LoopSearch(const Reading& reading, const std::vector<ReadSurface>& surfaces)
        : reading_(reading), surfaces_(surfaces), seen_(surfaces.size(), Seen::never) {}

    void from(std::size_t start) {
        if (seen_[start] != Seen::never) return;
        step_onto(start);
        while (!path_.empty()) {
            auto& [surface, next] = path_.back();
            const auto& targets = surfaces_[surface].surface.runs_onto;
            if (next == targets.size()) {
                seen_[surface] = Seen::done;
                path_.pop_back();
                continue;
            }
            const std::size_t target = targets[next++].surface;
            if (seen_[target] == Seen::never)
                step_onto(target);
            else if (seen_[target] == Seen::on_path)
                report(target);
        }
    }

private:
    enum class Seen { never, on_path, done };

    void step_onto(std::size_t surface) {
        seen_[surface] = Seen::on_path;
        path_.emplace_back(surface, 0);
    }

    void report(std::size_t first) const {
        const auto begin =
            std::ranges::find(path_, first, &std::pair<std::size_t, std::size_t>::first);
        std::string loop;
        const std::size_t length = static_cast<std::size_t>(path_.end() - begin);
        for (auto step = begin; step != path_.end(); ++step) {
            const auto at = static_cast<std::size_t>(step - begin);
            if (length <= kMostNamed || at < kMostNamed - 1 || at == length - 1)
                loop += cut(surfaces_[step->first].surface.name) + " -> ";
            else if (at == kMostNamed - 1)
                loop += "(" + std::to_string(length - kMostNamed) + " more) -> ";
        }
        loop += cut(surfaces_[first].surface.name);
        reading_.error(mark_of_run_on(path_.back().first, first),
                       "run-on goes round in a loop: " + loop,
                       "take one runs_onto out; water must come to a place drained to");
    }

    [[nodiscard]] YAML::Mark mark_of_run_on(std::size_t giver, std::size_t receiver) const {
        const auto& shares = surfaces_[giver].runs_onto;
        return std::ranges::find(shares, surfaces_[receiver].surface.name, &NamedShare::surface)
            ->mark;
    }

    const Reading& reading_;
    const std::vector<ReadSurface>& surfaces_;
    std::vector<Seen> seen_;
    std::vector<std::pair<std::size_t, std::size_t>> path_;  // surface and its next target
};

}  // namespace

std::vector<NamedShare> read_runs_onto(const Reading& reading, const Entry& entry) {
    std::vector<NamedShare> shares;
    if (!entry.value.IsMap()) {
        if (const auto name = read_text(reading, entry, kRunOnExample, "a name or a map"))
            shares.push_back({*name, entry.mark(), 1.0});
        return shares;
    }
    double sum = 0.0;
    for (const Entry& named : entries_of(reading, entry, "runs_onto")) {
        if (const auto hint = hint_for_lone_key(named.key); hint && named.value.IsNull()) {
            reading.error(named.key_mark, in_quotes(named.key) + " is empty", *hint);
            continue;
        }
        const double share = read_share(reading, named).value_or(0.0);
        shares.push_back({named.key, named.key_mark, share});
        sum += share;
    }
    if (entry.value.size() == 0)
        reading.error(entry.mark(), "'runs_onto' names no surface", kRunOnExample);
    if (sum > 1.0 + kShareRoom)
        reading.error(entry.key_mark, "the shares of runs_onto sum to more than one",
                      "what they leave of the excess goes to drains_to");
    return shares;
}

void resolve_run_on(const Reading& reading, std::vector<ReadSurface>& surfaces) {
    Names names;
    for (std::size_t i = 0; i < surfaces.size(); ++i)
        names.emplace(surfaces[i].surface.name, i);
    for (std::size_t i = 0; i < surfaces.size(); ++i)
        resolve_one(reading, surfaces, names, i);
    LoopSearch search(reading, surfaces);
    for (std::size_t i = 0; i < surfaces.size(); ++i)
        search.from(i);
}

}  // namespace rainledger
