#pragma once

#include <string>

#include "folder.hpp"
#include "scenario/read_text.hpp"

// Scenarios of storms beside their tables and records, in a folder of their own.
namespace rainledger {

/// A folder with an invented county's rainfall and the records of an invented gauge.
class StormRoom {
public:
    StormRoom() {
        folder_.write("county.csv",
                      "duration,2 yr [mm],10 yr [mm],100 yr [mm]\n5 min,8.2,12.5,18.6\n"
                      "1 h,27.1,41,61.1\n2 h,31.7,48,71.5\n24 h,58.1,88,131.1\n");
        folder_.write("list.csv", "duration,depth [mm]\n5 min,9.8\n1 h,32\n2 h,40\n");
        folder_.write("falling.csv",
                      "duration,2 yr [mm],10 yr [mm]\n5 min,8.2,12.5\n1 h,27.1,11\n");
        folder_.write("logger.csv", tips(""));
        folder_.write("zoned.csv", tips("+02:00"));
        folder_.write("hourly.csv",
                      "end,depth [mm]\n2031-06-01 01:00,0.0\n2031-06-01 02:00,0.0\n"
                      "2031-06-10 03:00,4.0\n2031-06-10 04:00,2.5\n2031-06-10 07:00,1.0\n"
                      "2031-06-12 01:00,0\n2031-06-12 02:00,6\n2031-06-12 03:00,0\n");
        folder_.write("elapsed.csv", "end [h],depth [mm]\n1,0\n2,3\n3,1\n20,2\n21,5\n");
        folder_.write("dry.csv", "end,depth [mm]\n2031-06-01 01:00,0.0\n2031-06-01 02:00,0.0\n");
    }

    void write(const std::string& name, const std::string& text) { folder_.write(name, text); }
    [[nodiscard]] std::string path(const std::string& name) const { return folder_.path(name); }

    /// Reads a scenario of this folder that needs no surfaces; the folder is left out of problems.
    [[nodiscard]] Outcome read(const std::string& yaml) const {
        Diagnostics diagnostics;
        Outcome outcome;
        outcome.scenario =
            read_scenario_text(folder_.path("lane.yaml"), yaml, diagnostics, Surfaces::not_needed);
        outcome.errors = diagnostics.error_count();
        for (const Diagnostic& diagnostic : diagnostics.list())
            outcome.problems += render(diagnostic);
        const std::string folder = folder_.path("");
        for (std::size_t at = outcome.problems.find(folder); at != std::string::npos;
             at = outcome.problems.find(folder, at))
            outcome.problems.erase(at, folder.size());
        return outcome;
    }
    [[nodiscard]] std::string problems(const std::string& yaml) const {
        return read(yaml).problems;
    }
    [[nodiscard]] std::string design_problems(const std::string& design) const {
        return problems("storm: {design: {" + design + "}}\n");
    }
    [[nodiscard]] std::string record_problems(const std::string& record) const {
        return problems("storm: {record: {" + record + "}}\n");
    }
    [[nodiscard]] std::string from_record_problems(const std::string& record) const {
        return problems("storms: {from_record: {" + record + "}}\n");
    }

private:
    /// Tips of three events: 3 on 2 June, 12 on the 14th, 5 on the 20th.
    static std::string tips(const std::string& offset) {
        std::string text = "time\n";
        for (const char* stamp :
             {"2031-06-02 04:10:20", "2031-06-02 04:17:00", "2031-06-02 04:25:20",
              "2031-06-14 13:46:05", "2031-06-14 13:46:35", "2031-06-14 13:47:05",
              "2031-06-14 13:47:40", "2031-06-14 13:48:25", "2031-06-14 13:49:25",
              "2031-06-14 13:51:05", "2031-06-14 13:53:05", "2031-06-14 13:56:05",
              "2031-06-14 14:01:05", "2031-06-14 14:11:05", "2031-06-14 14:26:05",
              "2031-06-20 22:01:00", "2031-06-20 22:11:00", "2031-06-20 22:21:00",
              "2031-06-20 22:26:00", "2031-06-20 22:51:00"})
            text += stamp + offset + "\n";
        return text;
    }

    testing::Folder folder_;
};

}  // namespace rainledger
