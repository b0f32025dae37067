#include "apps/run.hpp"

int main(int argc, char** argv) { return swaymark::run(argc, argv); }
