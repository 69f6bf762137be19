#include "published/check_file.hpp"

#include <algorithm>
#include <array>
#include <set>
#include <stdexcept>
#include <string_view>

#include <yaml-cpp/yaml.h>

#include "published/operations.hpp"
#include "published/storm_books.hpp"

namespace rainledger::published {
namespace {

[[noreturn]] void refuse(const std::string& where, const std::string& what) {
    throw std::runtime_error(where + ": " + what);
}

/// A YAML map whose every key must be taken.
class Keys {
public:
    Keys(const YAML::Node& node, std::string where) : where_(std::move(where)) {
        if (!node.IsMap()) refuse(where_, "is not a map");
        for (const auto& pair : node)
            if (!left_.emplace(pair.first.Scalar(), pair.second).second)
                refuse(where_, "key '" + pair.first.Scalar() + "' stands twice");
    }

    std::optional<YAML::Node> take_if_there(const std::string& key) {
        const auto found = left_.find(key);
        if (found == left_.end()) return std::nullopt;
        const YAML::Node node = found->second;
        left_.erase(found);
        return node;
    }
    YAML::Node take(const std::string& key) {
        const auto node = take_if_there(key);
        if (!node) refuse(where_, "key '" + key + "' is missing");
        return *node;
    }
    std::string text(const std::string& key) {
        const std::string value = take(key).Scalar();
        if (value.empty()) refuse(where_, "key '" + key + "' is empty");
        return value;
    }
    std::string text_if_there(const std::string& key) {
        const auto node = take_if_there(key);
        return node ? node->Scalar() : std::string{};
    }
    void finish() const {
        if (!left_.empty()) refuse(where_, "key '" + left_.begin()->first + "' is not used");
    }
    [[nodiscard]] const std::string& where() const { return where_; }

private:
    std::string where_;
    std::map<std::string, YAML::Node> left_;
};

Inputs read_inputs(const YAML::Node& node, const std::string& where) {
    if (!node.IsMap()) refuse(where, "inputs are not a map");
    Inputs inputs;
    for (const auto& pair : node)
        inputs.add(pair.first.Scalar(), pair.second.Scalar());
    return inputs;
}

Computation read_computation(Keys& keys) {
    Computation computation;
    computation.operation = keys.text("operation");
    if (computation.operation != "storm") {
        static_cast<void>(find_operation(computation.operation));
        computation.inputs = read_inputs(keys.take("inputs"), keys.where());
        return computation;
    }
    computation.storm = keys.text("storm");
    computation.quantity = keys.text("quantity");
    static_cast<void>(find_storm_quantity(computation.quantity));
    if (const auto at = keys.take_if_there("at")) computation.at = parse_value_row(at->Scalar());
    return computation;
}

Reproduces read_mark(const std::string& text, const std::string& where) {
    if (text.empty() || text == "yes") return Reproduces::yes;
    if (text == "rounding") return Reproduces::rounding;
    if (text == "no") return Reproduces::no;
    refuse(where, "unknown mark '" + text + "'");
}

void read_reason(Check& check, Keys& keys) {
    check.reproduces = read_mark(keys.text_if_there("reproduces"), keys.where());
    if (check.reproduces == Reproduces::yes) return;
    check.why = keys.text("why");
    check.exact = parse_value_row(keys.text("exact"));
    if (check.exact->unit != check.expected.unit ||
        check.exact->numbers.size() != check.expected.numbers.size())
        refuse(keys.where(), "`exact` and `expected` differ in unit or number");
    if (check.reproduces != Reproduces::rounding) return;
    Keys route(keys.take("as_rounded"), keys.where() + ": as_rounded");
    check.as_rounded = read_computation(route);
    route.finish();
}

std::string read_status(Keys& keys) {
    constexpr std::array<std::string_view, 3> kStatuses{"confirmed", "from memory", "derived"};
    const std::string status = keys.text("status");
    if (std::find(kStatuses.begin(), kStatuses.end(), status) == kStatuses.end())
        refuse(keys.where(), "unknown status '" + status + "'");
    return status;
}

Check read_check(const YAML::Node& node, const std::string& file) {
    Keys keys(node, file);
    Check check;
    check.id = keys.text("id");
    Keys rest(node, file + ": " + check.id);
    static_cast<void>(rest.take("id"));
    check.source = rest.text("source");
    check.place = rest.text("place");
    check.status = read_status(rest);
    check.computation = read_computation(rest);
    check.expected = parse_value_row(rest.text("expected"));
    read_reason(check, rest);
    check.note = rest.text_if_there("note");
    rest.finish();
    return check;
}

StoredStorm read_storm(const YAML::Node& node, const std::string& where) {
    Keys keys(node, where);
    StoredStorm storm;
    storm.scenario = keys.text("scenario");
    const std::string through = keys.text_if_there("through_program");
    if (!through.empty() && through != "true") refuse(where, "through_program is not 'true'");
    storm.through_program = through == "true";
    keys.finish();
    return storm;
}

void require_all_used(const CheckFile& file) {
    std::set<std::string> sources;
    std::set<std::string> storms;
    for (const Check& check : file.checks) {
        const std::string& storm = check.computation.storm;
        if (file.sources.count(check.source) == 0)
            refuse(file.name + ": " + check.id, "unknown source '" + check.source + "'");
        if (!storm.empty() && file.storms.count(storm) == 0)
            refuse(file.name + ": " + check.id, "unknown storm '" + storm + "'");
        sources.insert(check.source);
        storms.insert(storm);
    }
    for (const auto& [key, text] : file.sources)
        if (sources.count(key) == 0) refuse(file.name, "source '" + key + "' is not used");
    for (const auto& [name, storm] : file.storms)
        if (storms.count(name) == 0) refuse(file.name, "storm '" + name + "' is not used");
}

}  // namespace

CheckFile read_check_file(const std::string& name, const std::string& text) {
    Keys keys(YAML::Load(text), name);
    CheckFile file;
    file.name = name;
    for (const auto& pair : keys.take("sources"))
        file.sources.emplace(pair.first.Scalar(), pair.second.Scalar());
    if (const auto storms = keys.take_if_there("storms"))
        for (const auto& pair : *storms)
            file.storms.emplace(pair.first.Scalar(),
                                read_storm(pair.second, name + ": " + pair.first.Scalar()));
    const YAML::Node checks = keys.take("checks");
    if (!checks.IsSequence() || checks.size() == 0) refuse(name, "has no checks");
    for (const YAML::Node& node : checks)
        file.checks.push_back(read_check(node, name));
    keys.finish();
    require_all_used(file);
    return file;
}

}  // namespace rainledger::published
