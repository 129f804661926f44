-- What stands in columns of its own since the last migration is taken from each study's newest save.
UPDATE `studies` INNER JOIN `saves` ON `saves`.`study_id` = `studies`.`id` AND `saves`.`kind` = 'accepted' AND `saves`.`number` = `studies`.`newest_number`
SET `studies`.`title` = JSON_VALUE(`saves`.`document`, '$.title'),
	`studies`.`about` = COALESCE(JSON_VALUE(`saves`.`document`, '$.about'), ''),
	`studies`.`key_tonic` = JSON_VALUE(`saves`.`document`, '$.key.tonic'),
	`studies`.`key_mode` = JSON_VALUE(`saves`.`document`, '$.key.mode'),
	`studies`.`chord_count` = JSON_LENGTH(`saves`.`document`, '$.chords');
